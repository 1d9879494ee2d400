import { FormErrors } from "@/components/ui/form-errors";
import { Notice } from "@/components/ui/notice";
import { CallError } from "@/lib/entry/fetcher";

export type SaveStateProps = {
  error: Error | null;
  saved: boolean;
  /** False where several forms on the page have fields of the same name, so that a link would lead to the wrong one. */
  linked?: boolean;
};

/** What became of saving: who changed what meanwhile, which fields are wrong, or that it is kept. */
export function SaveState({ error, saved, linked = true }: SaveStateProps) {
  if (error instanceof CallError && error.status === 409) {
    return (
      <Notice kind="stop" live="alert" title={error.message}>
        {error.missing.length > 0 && (
          <ul className="mt-1 list-disc pl-5">
            {error.missing.map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
        )}
        {error.missing.length > 0 && <p className="mt-1">Fields that you did not touch now show the new values. Save again to put yours on top.</p>}
      </Notice>
    );
  }
  if (error) {
    const fields = error instanceof CallError ? Object.entries(error.fields).flatMap(([name, messages]) => messages.map((message) => (linked ? { name, message } : { message }))) : [];
    return <FormErrors title={error.message} errors={fields.length > 0 ? fields : [{ message: "What you typed is still here." }]} />;
  }
  return (
    <p role="status" className="text-14 font-[620] text-verdigris">
      {saved && "Saved."}
    </p>
  );
}

/** The message for a field of a refused form. */
export const fieldErrorOf = (error: Error | null) => (path: string) => (error instanceof CallError ? (error.fields[path]?.[0] ?? null) : null);
