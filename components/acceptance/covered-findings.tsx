import { toneOfFinding } from "@/components/findings/finding-tone";
import { State } from "@/components/ui/state";
import { TextLink } from "@/components/ui/link-button";
import type { CoveredFinding } from "@/lib/acceptance/types";
import { FINDING_STATE_LABELS, SEVERITY_LABELS } from "@/lib/findings/vocabulary";
import { routes } from "@/lib/routes";

/** The findings of a leg as a signature covers them. */
export function CoveredFindings({ moveId, findings }: { moveId: string; findings: readonly CoveredFinding[] }) {
  if (findings.length === 0) return <p className="text-14 text-ink-2">No findings were posted on this leg.</p>;
  return (
    <section aria-label="Findings of this leg">
      <p className="lab mb-1">Findings of this leg</p>
      <ul className="border-t border-rule text-14">
        {findings.map((finding) => (
          <li key={finding.id} className="flex flex-wrap items-center justify-between gap-x-4 gap-y-1 border-b border-rule py-2">
            <span>
              <TextLink href={routes.finding(moveId, finding.id)} className="inline-flex items-center font-[620] max-sm:min-h-11">{finding.label}, {finding.component}</TextLink>
              <span className="block text-ink-2">{SEVERITY_LABELS[finding.severity]}</span>
            </span>
            <State tone={toneOfFinding(finding)}>{FINDING_STATE_LABELS[finding.state]}</State>
          </li>
        ))}
      </ul>
    </section>
  );
}
