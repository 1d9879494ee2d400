import { Locator } from "@/components/drawing/locator";
import { EnteredBy } from "@/components/access/entered-by";
import { PhotoStrip } from "@/components/evidence/photo-strip";
import { Notice } from "@/components/ui/notice";
import { State } from "@/components/ui/state";
import { Mono } from "@/components/ui/text";
import type { FindingDetail } from "@/lib/findings/types";
import { SEVERITY_LABELS } from "@/lib/findings/vocabulary";
import { stateWords, titleWords } from "@/lib/findings/words";
import { airCaution } from "@/lib/inspections/rules";
import { formatShortDay, formatWhen } from "@/lib/moves/when";
import { toneOfFinding } from "./finding-tone";

const SECTION = "border-b border-rule-strong px-4 py-4 sm:px-6";

/** What the finding is, where it is drawn, and for how long it has been in its state. */
export function FindingHead({ finding }: { finding: FindingDetail }) {
  const { placeId, unit } = finding;
  return (
    <div className={SECTION}>
      <p className="lab">
        <Mono className="mr-2 max-sm:hidden">{finding.label}</Mono>
        Finding by {finding.carrierName}, {formatShortDay(finding.visitedOn)}
      </p>
      <h2 className="mt-1 mb-2 text-21 leading-tight font-[700] tracking-[-0.01em] sm:text-28">{titleWords(finding.component, finding.where)}</h2>
      <div className="flex flex-wrap items-center gap-x-4 gap-y-2">
        <State tone={toneOfFinding(finding)} className="text-14">{stateWords(finding, finding.now)}</State>
        <span className="text-14 font-[620]">{SEVERITY_LABELS[finding.severity]}</span>
      </div>
      {unit.form && placeId && <Locator form={unit.form} rings={[{ placeId, tone: finding.state === "cleared" ? "verdigris" : "oxide" }]} className="mt-4" />}
    </div>
  );
}

/** What was measured or seen, under which condition, and what it shows. */
export function FoundPart({ finding }: { finding: FindingDetail }) {
  const caution = airCaution(finding.air, finding.group === "brakes");
  return (
    <section aria-label="Found" className={`${SECTION} grid gap-3 lg:border-b-0`}>
      <div className="flex items-baseline justify-between gap-4">
        <span className="lab">Found</span>
        {finding.reading && <Mono className="text-21 font-semibold">{finding.reading}</Mono>}
      </div>
      <p className="text-15 whitespace-pre-line [overflow-wrap:anywhere]">{finding.observed}</p>
      {finding.condition && <p className="text-14 text-ink-2">Condition: {finding.condition}</p>}
      {caution && <Notice title={finding.air === "off" ? "Taken without air" : "Air not said"}>{caution}</Notice>}
      {finding.photos.length > 0 ? <PhotoStrip photos={finding.photos} /> : finding.noPhotoReason && <p className="text-14 text-ink-2">No photo: {finding.noPhotoReason}</p>}
      <p className="text-14 text-ink-2">
        {finding.inspectorName} on visit {finding.visitNumber}; posted {formatWhen(finding.at, finding.zone)}
        {!finding.enteredFor && <> by {finding.byName}</>}.
      </p>
      {finding.enteredFor && <EnteredBy enteredFor={finding.enteredFor} byName={finding.byName} />}
    </section>
  );
}
