import { restrictionLabels } from "@/lib/acceptance/rules";
import type { RestrictionId } from "@/lib/acceptance/vocabulary";

/** Restrictions in words. */
export function RestrictionList({ restrictions, note }: { restrictions: readonly RestrictionId[]; note: string | null }) {
  if (restrictions.length === 0 && !note) return <p>No restrictions were set.</p>;
  return (
    <div>
      <p className="lab mb-1">Restrictions</p>
      <ul className="border-t border-rule">
        {restrictionLabels(restrictions).map((label) => (
          <li key={label} className="border-b border-rule py-1.5 font-[620]">{label}</li>
        ))}
        {note && <li className="border-b border-rule py-1.5 whitespace-pre-line">{note}</li>}
      </ul>
    </div>
  );
}
