"use client";

import { type ComponentProps, type MouseEvent } from "react";
import { SelectField, type ChoiceGroup } from "@/components/ui/select-field";
import { placesOn, type Place, type UnitForm } from "@/lib/moves/places";
import { LocatorDrawing } from "./locator-drawing";
import { LOCATOR, nearestPlace } from "./place-points";

function grouped(places: readonly Place[]): ChoiceGroup[] {
  const groups = [...new Set(places.map((place) => place.group))];
  return groups.map((group) => ({ group, choices: places.filter((place) => place.group === group).map(({ id, name }) => ({ value: id, label: name })) }));
}

export type PlaceFieldProps = Omit<ComponentProps<typeof SelectField>, "choices" | "value" | "onChange" | "defaultValue" | "form"> & {
  form: UnitForm;
  /** The id of the place, or "" while none is chosen. */
  value: string;
  onChange: (placeId: string) => void;
};

/** Chooses a place on the unit by touching the drawing, or from the list with the same places. */
export function PlaceField({ form, value, onChange, ...field }: PlaceFieldProps) {
  function touch(event: MouseEvent<SVGSVGElement>) {
    const frame = event.currentTarget.getBoundingClientRect();
    const place = nearestPlace(form, {
      x: ((event.clientX - frame.left) / frame.width) * LOCATOR.width,
      y: ((event.clientY - frame.top) / frame.height) * LOCATOR.height,
    });
    if (place) onChange(place);
  }

  return (
    <div>
      {/* The list below is the same choice for a keyboard and a screen reader. */}
      <svg aria-hidden="true" viewBox={`0 0 ${LOCATOR.width} ${LOCATOR.height}`} onClick={touch} className="mb-3 block h-auto w-full max-w-[460px] cursor-crosshair touch-manipulation">
        <LocatorDrawing form={form} rings={value ? [{ placeId: value, tone: "ink" }] : []} />
      </svg>
      <SelectField blank="Touch the drawing or choose here" {...field} value={value} onChange={(event) => onChange(event.target.value)} choices={grouped(placesOn(form))} />
    </div>
  );
}
