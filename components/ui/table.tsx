import { clsx } from "clsx";
import { type ComponentProps, type ReactNode } from "react";

export type TableProps = ComponentProps<"table"> & {
  caption: ReactNode;
  /** Shows the caption above the table; otherwise only a screen reader says it. */
  captionShown?: boolean;
  /** A rule around the whole table, for one that stands on the card by itself. */
  framed?: boolean;
  /** On a phone each row becomes a block; every cell then needs `label`. Otherwise the table scrolls sideways. */
  stack?: boolean;
};

/** A ruled table. */
export function Table({ caption, captionShown, framed, stack, className, children, ...props }: TableProps) {
  return (
    <div className={clsx("min-w-0", !stack && "overflow-x-auto")}>
      <table {...props} data-framed={framed ? "" : undefined} data-stack={stack ? "" : undefined} className={clsx("ruled-table", className)}>
        <caption className={captionShown ? "mb-2 text-left text-15 font-[640]" : "sr-only"}>{caption}</caption>
        {children}
      </table>
    </div>
  );
}

/** The head of a column; `mono` sets nothing, figures stand in their cells. */
export function Th({ className, scope = "col", ...props }: ComponentProps<"th">) {
  return <th {...props} scope={scope} className={clsx("lab", className)} />;
}

/** A cell; `label` is its column's name where rows stack on a phone. */
export function Td({ label, mono, className, ...props }: ComponentProps<"td"> & { label?: string; mono?: boolean }) {
  return <td {...props} data-label={label} className={clsx(mono && "figure", className)} />;
}

/** The cell that names its row. */
export function RowHead({ className, ...props }: ComponentProps<"th">) {
  return <th {...props} scope="row" className={className} />;
}
