/** One part of a thing, behind a folder tab. */
export type Tab = {
  href: string;
  label: string;
  /** How many things wait in there; nothing is shown for null or zero. */
  count?: number | null;
  current?: boolean;
};
