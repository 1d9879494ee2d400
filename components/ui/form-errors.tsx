import { fieldId } from "./field-id";

export type FormError = {
  /** The field's name; left out for what concerns the whole form. */
  name?: string;
  message: string;
};

/** Everything that kept a form from being saved, each line leading to its field; nothing at all when there is no error. */
export function FormErrors({ errors, title = "Nothing was saved." }: { errors: readonly FormError[]; title?: string }) {
  if (errors.length === 0) return null;
  return (
    <div role="alert" tabIndex={-1} className="border border-l-[5px] border-oxide bg-oxide-wash px-4 py-3">
      <p className="font-[680]">{title}</p>
      <ul className="mt-1">
        {errors.map(({ name, message }) => (
          <li key={`${name ?? ""} ${message}`} className="text-14">
            {name ? (
              <a href={`#${fieldId(name)}`} className="inline-flex min-h-6 items-center text-oxide underline underline-offset-3 max-sm:min-h-11">
                {message}
              </a>
            ) : (
              message
            )}
          </li>
        ))}
      </ul>
    </div>
  );
}
