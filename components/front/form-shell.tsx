"use client";

import { useActionState, type ReactNode } from "react";
import { FormErrors, type FormError } from "@/components/ui/form-errors";
import type { FormState } from "@/lib/entry/form";

export type FormAction = (state: FormState, data: FormData) => Promise<FormState>;

const BLANK: FormState = { message: null, fields: {}, values: {} };

/** What went wrong, each field's message leading to its field. */
function errorsOf({ message, fields }: FormState, shown: readonly string[]): FormError[] {
  const ofFields = Object.entries(fields).flatMap(([name, messages]) => messages.map((text) => (shown.includes(name) ? { name, message: text } : { message: text })));
  return ofFields.length > 0 ? ofFields : message ? [{ message }] : [];
}

type FormShellProps = { action: FormAction; title?: string; fieldNames: readonly string[]; children: (form: { error: (name: string) => string | null; typed: (name: string) => string; state: FormState }) => ReactNode };

/** A plain form that works without script: sent to a server action, errors beside their fields, what was typed kept. */
export function FormShell({ action, title = "That did not go through.", fieldNames, children }: FormShellProps) {
  const [state, send] = useActionState(action, BLANK);
  return (
    <form action={send} noValidate className="grid gap-5">
      <FormErrors title={title} errors={errorsOf(state, fieldNames)} />
      {children({ error: (name) => state.fields[name]?.[0] ?? null, typed: (name) => state.values[name] ?? "", state })}
    </form>
  );
}
