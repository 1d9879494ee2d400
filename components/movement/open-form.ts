/** The one form that is open on the page; a second would have the same field names. */
export type OpenForm =
  | { form: "instruction" | "sighting"; legId: string }
  | { form: "withdraw"; id: string }
  | { form: "retract" | "correct"; id: string }
  | { form: "release" | "arrival" | "closing" };

export type FormSwitch = { open: OpenForm | null; show: (form: OpenForm | null) => void };
