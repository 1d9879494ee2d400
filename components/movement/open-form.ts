/** The one form that is open on the page; a second would have the same field names. */
export type OpenForm =
  | { form: "instruction" | "sighting"; legId: string }
  | { form: "withdraw" | "retract" | "correct"; legId: string; id: string }
  | { form: "release" | "arrival" | "closing" };

export type FormSwitch = { open: OpenForm | null; show: (form: OpenForm | null) => void };

/** The part of the page that a form belongs to; the focus goes there when the form closes. */
export const homeOf = (form: OpenForm) => ("legId" in form ? `leg-${form.legId}` : form.form);

/** For a form that opens where a button was: the focus follows, so that a keyboard goes on from there. */
export function focusOpened(form: HTMLFormElement | null): void {
  form?.focus();
}
