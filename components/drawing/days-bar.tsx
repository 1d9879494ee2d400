import { clsx } from "clsx";
import { useId } from "react";

/** Whose days they were: a ground for each, so that neighbours tell apart. */
export type DaysTone = "owner" | "contractor" | "carrier" | "money" | "other";

export type DaysPart = { id: string; label: string; days: number; tone: DaysTone };

const GROUNDS: Record<DaysTone, { fill: string; text: string }> = {
  owner: { fill: "fill-manila", text: "fill-ink" },
  contractor: { fill: "fill-sheet", text: "fill-ink" },
  carrier: { fill: "fill-brass-wash", text: "fill-brass" },
  money: { fill: "fill-slate-wash", text: "fill-slate" },
  other: { fill: "fill-card", text: "fill-ink-2" },
};

const HEIGHT = 30;

/** Where the days went, as one bar. Parts too narrow for their words are told in the list below it. */
export function DaysBar({ label, parts, className }: { label: string; parts: readonly DaysPart[]; className?: string }) {
  const id = useId();
  const shown = parts.filter((part) => part.days > 0);
  const total = shown.reduce((sum, part) => sum + part.days, 0);
  if (total === 0) return null;
  const share = (days: number) => `${Math.round((days / total) * 10_000) / 100}%`;
  const starts = shown.map((_, at) => shown.slice(0, at).reduce((sum, part) => sum + part.days, 0));
  return (
    <figure aria-labelledby={id} className={className}>
      <figcaption id={id} className="lab mb-1.5">
        {label}
      </figcaption>
      <svg aria-hidden="true" width="100%" height={HEIGHT} className="block border border-rule-strong text-13 font-[620]">
        {shown.map((part, at) => (
          <svg key={part.id} x={share(starts[at] ?? 0)} width={share(part.days)} height={HEIGHT}>
            <rect width="100%" height={HEIGHT} className={GROUNDS[part.tone].fill} />
            <text x="8" y="20" className={clsx(GROUNDS[part.tone].text, "max-sm:hidden")}>
              {part.label} {part.days}
            </text>
            <text x="50%" y="20" textAnchor="middle" className={clsx(GROUNDS[part.tone].text, "figure sm:hidden")}>
              {part.days}
            </text>
            {at > 0 && <line x1="0.5" x2="0.5" y1="0" y2={HEIGHT} className="stroke-rule-strong" />}
          </svg>
        ))}
      </svg>
      <ul className="mt-1.5 flex flex-wrap gap-x-5 gap-y-1 text-14 text-ink-2">
        {shown.map((part) => (
          <li key={part.id} className="flex items-center gap-2">
            <svg aria-hidden="true" width="12" height="12" viewBox="0 0 12 12">
              <rect x="0.5" y="0.5" width="11" height="11" className={clsx(GROUNDS[part.tone].fill, "stroke-rule-strong")} />
            </svg>
            {part.label}: {part.days === 1 ? "1 day" : `${part.days} days`}
          </li>
        ))}
      </ul>
    </figure>
  );
}
