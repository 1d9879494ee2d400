import type { DraftForm } from "@/lib/moves/draft";

/** What every section of the form works with. */
export type SectionProps = {
  form: DraftForm;
  /** Replaces what is named; the rest stays. */
  change: (patch: Partial<DraftForm>) => void;
  /** The message for a field by its path; null when there is nothing to say. */
  errorOf: (path: string) => string | null;
};
