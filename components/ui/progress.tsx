import { useId, type ReactNode } from "react";

/** How far something is, as words and a bar: "31 of 34". */
export function Progress({ label, value, max, words }: { label: ReactNode; value: number; max: number; words?: ReactNode }) {
  const id = useId();
  return (
    <div>
      <div className="mb-1 flex items-baseline justify-between gap-4">
        <label htmlFor={id} className="lab">
          {label}
        </label>
        <span className="figure text-14">{words ?? `${value} of ${max}`}</span>
      </div>
      <progress id={id} value={value} max={Math.max(max, 1)} className="progress" />
    </div>
  );
}
