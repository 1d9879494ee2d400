import { later } from "@/components/ui/later";

// The forms come after the finding, which can be read sooner so on a slow line.
export const AnswerForm = later(() => import("./answer-form").then((file) => file.AnswerForm));
export const ReplyForm = later(() => import("./reply-form").then((file) => file.ReplyForm));

/** Fetches the forms ahead, so that they are there when the signal is gone. */
export const loadForms = () => Promise.all([AnswerForm, ReplyForm].map((form) => form.load()));
