import type { EnteredSource } from "@/lib/access/vocabulary";

/** What a form holds of how news of an absent carrier came in; sent as `enteredFor`. */
export type EnteredForValue = { source: EnteredSource | ""; heardOn: string; saidBy: string; reference: string };

export const EMPTY_ENTERED_FOR: EnteredForValue = { source: "", heardOn: "", saidBy: "", reference: "" };
