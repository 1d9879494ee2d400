import { type ReactNode } from "react";
import { FieldBar } from "@/components/shell/top-bar";
import { Sheet } from "@/components/ui/sheet";

export type FieldScreenProps = { backHref: string; unit: string; note: string; title: string; lead: ReactNode; children: ReactNode };

/** A form that is filled beside the unit: on a phone it has the screen to itself, at a desk it is a sheet of the case. */
export function FieldScreen({ backHref, unit, note, title, lead, children }: FieldScreenProps) {
  return (
    <div data-field-screen="" className="max-sm:-mx-4">
      <h1 className="sr-only sm:hidden">{unit}</h1>
      <FieldBar backHref={backHref} backLabel={unit} note={note} />
      <Sheet title={title} lead={lead} className="max-sm:border-0">{children}</Sheet>
    </div>
  );
}
