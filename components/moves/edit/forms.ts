import { later } from "@/components/ui/later";

// The forms of this tab come after it, so that the unit and its route can be read sooner on a slow line.
export const LegForm = later(() => import("./leg-form").then((file) => file.LegForm));
export const EndsForm = later(() => import("./ends-form").then((file) => file.EndsForm));
export const CancelDialog = later(() => import("./cancel-dialog").then((file) => file.CancelDialog));

/** Fetches the forms ahead, so that they are there when they are opened. */
export const loadForms = () => Promise.all([LegForm, EndsForm, CancelDialog].map((form) => form.load()));
