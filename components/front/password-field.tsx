"use client";

import { useState } from "react";
import { useFormStatus } from "react-dom";
import { describeField, FieldFrame, type FieldProps } from "@/components/ui/field";

type PasswordFieldProps = FieldProps & { autoComplete: "current-password" | "new-password"; value?: string; onChange?: (typed: string) => void };

/** A password, hidden unless asked; what was typed stays in the field when the form comes back with an error. */
export function PasswordField({ label, hint, error, required, className, name, id, autoComplete, value, onChange }: PasswordFieldProps) {
  const [shown, setShown] = useState(false);
  const [own, setOwn] = useState("");
  const { pending } = useFormStatus();
  const described = describeField({ id, name, hint, error });
  // While the form is under way the field is hidden again, so that no browser keeps it among its texts.
  const visible = shown && !pending;
  return (
    <FieldFrame id={described.id} {...{ label, hint, error, required, className }}>
      <div className="flex items-stretch">
        <input
          {...described}
          name={name}
          type={visible ? "text" : "password"}
          autoComplete={autoComplete}
          autoCapitalize="none"
          spellCheck={false}
          required={required}
          value={value ?? own}
          onChange={(event) => (onChange ?? setOwn)(event.target.value)}
          className="field-box min-w-0"
        />
        <button type="button" aria-pressed={shown} aria-controls={described.id} onClick={() => setShown(!shown)} className="border border-l-0 border-rule-strong bg-manila px-3.5 text-14 font-[620] whitespace-nowrap">
          {shown ? "Hide" : "Show"}
          <span className="sr-only"> the password</span>
        </button>
      </div>
    </FieldFrame>
  );
}
