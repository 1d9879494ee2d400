import { clsx } from "clsx";
import { type ComponentProps, type ReactNode } from "react";
import { Options, type SelectFieldProps } from "./select-field";

const CONTROL = "filter-box";

/** Filters as boxes of the same form, standing on the table that they filter. */
export function FilterBar({ children, className }: { children: ReactNode; className?: string }) {
  return (
    <div className={clsx("overflow-hidden border border-b-0 border-rule-strong bg-sheet", className)}>
      <div className="-mr-px grid grid-cols-2 sm:flex sm:flex-wrap">{children}</div>
    </div>
  );
}

function FilterBox({ label, wide, children }: { label: ReactNode; wide?: boolean; children: ReactNode }) {
  return (
    <label className={clsx("relative block min-w-0 border-r border-b border-rule hover:bg-manila sm:min-w-36", wide ? "col-span-2 sm:flex-2" : "sm:flex-1")}>
      <span className="lab absolute top-2 left-3.5">{label}</span>
      {children}
    </label>
  );
}

type FilterTextProps = ComponentProps<"input"> & { name: string; label: ReactNode };

/** Words to look for. */
export function FilterText({ label, type = "search", ...props }: FilterTextProps) {
  return (
    <FilterBox label={label} wide>
      <input {...props} type={type} className={CONTROL} />
    </FilterBox>
  );
}

type FilterSelectProps = Omit<ComponentProps<"select">, "children"> & Pick<SelectFieldProps, "choices" | "blank"> & { name: string; label: ReactNode };

/** One of a list; `blank` says what no choice means: "anyone". */
export function FilterSelect({ label, choices, blank, ...props }: FilterSelectProps) {
  return (
    <FilterBox label={label}>
      <select {...props} className={CONTROL}>
        <Options choices={choices} blank={blank} />
      </select>
    </FilterBox>
  );
}
