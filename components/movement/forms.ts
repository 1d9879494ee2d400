import { later } from "@/components/ui/later";

// The forms of this tab come after it, so that the movement itself can be read sooner on a slow line.
export const SightingForm = later(() => import("./sighting-form").then((file) => file.SightingForm));
export const InstructionForm = later(() => import("./instruction-form").then((file) => file.InstructionForm));
export const ArrivalForm = later(() => import("./arrival-form").then((file) => file.ArrivalForm));
export const ReleaseDialog = later(() => import("./release-dialog").then((file) => file.ReleaseDialog));
export const RetractForm = later(() => import("./retract-form").then((file) => file.RetractForm));
export const WithdrawForm = later(() => import("./withdraw-form").then((file) => file.WithdrawForm));

/** Fetches the forms ahead, so that they are there when they are opened. */
export const loadForms = () => Promise.all([SightingForm, InstructionForm, ArrivalForm, ReleaseDialog, RetractForm, WithdrawForm].map((form) => form.load()));
