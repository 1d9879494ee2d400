"use client";

import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { TextField } from "@/components/ui/text-field";
import { emptyLeg, type LegForm } from "@/lib/moves/draft";
import { PayerFields } from "../payer-fields";
import { ZoneField } from "../zone-field";
import type { SectionProps } from "./section";

const MOST_LEGS = 12;

type LegFieldsProps = { leg: LegForm; at: number; last: boolean; from: string; to: string; ownerName: string; onChange: (leg: LegForm) => void; onRemove: (() => void) | null; errorOf: SectionProps["errorOf"] };

function LegFields({ leg, at, last, from, to, ownerName, onChange, onRemove, errorOf }: LegFieldsProps) {
  const path = `legs.${at}`;
  const set = (patch: Partial<LegForm>) => onChange({ ...leg, ...patch });
  return (
    <fieldset className="min-w-0 border border-rule-strong p-4 sm:p-5">
      <legend className="px-2 text-15 font-[680]">Leg {at + 1}</legend>
      <p className="mb-4 text-14 text-ink-2">
        Takes over at {from || "the origin"}
        {last ? ` and goes to ${to || "the destination"}.` : ", and hands over at the interchange below."}
      </p>
      <div className="grid gap-5 sm:grid-cols-2">
        <TextField name={`${path}.carrierName`} label="Carrier" hint="The railroad that moves it on this stretch." required autoComplete="off" value={leg.carrierName} onChange={(event) => set({ carrierName: event.target.value })} error={errorOf(`${path}.carrierName`)} />
        <div className="grid grid-cols-2 gap-5">
          <TextField name={`${path}.carrierMark`} label="Its code" hint="Up to four letters." mono autoComplete="off" autoCapitalize="characters" maxLength={4} value={leg.carrierMark} onChange={(event) => set({ carrierMark: event.target.value })} error={errorOf(`${path}.carrierMark`)} />
          <TextField name={`${path}.miles`} label="Miles" hint="As far as known." mono inputMode="numeric" autoComplete="off" value={leg.miles} onChange={(event) => set({ miles: event.target.value })} error={errorOf(`${path}.miles`)} />
        </div>
        {!last && <TextField name={`${path}.toPlace`} label="Interchange with the next carrier" hint="The place where the next one takes over." required autoComplete="off" value={leg.toPlace} onChange={(event) => set({ toPlace: event.target.value })} error={errorOf(`${path}.toPlace`)} />}
        {!last && <ZoneField name={`${path}.toZone`} required value={leg.toZone} onChange={(toZone) => set({ toZone })} error={errorOf(`${path}.toZone`)} />}
        <div className="sm:col-span-2">
          <PayerFields path={`${path}.`} ownerName={ownerName} payer={leg.payer} payerName={leg.payerName} onChange={set} errorOf={errorOf} />
        </div>
      </div>
      {onRemove && (
        <Button variant="plain" size="small" className="mt-3" onClick={onRemove}>
          Take leg {at + 1} out
        </Button>
      )}
    </fieldset>
  );
}

/** The carriers in their order, where each hands over to the next, and who pays each of them. */
export function RouteSection({ form, change, errorOf, ownerName }: SectionProps & { ownerName: string }) {
  const { legs, origin, destination } = form;
  const put = (at: number, leg: LegForm) => change({ legs: legs.map((one, index) => (index === at ? leg : one)) });
  const add = () => {
    const key = String(Math.max(...legs.map((leg) => Number(leg.key) || 0)) + 1);
    // A hand-over mostly keeps the clock of the place before it.
    const zoned = legs.map((leg, at) => (at === legs.length - 1 && leg.toZone === "" ? { ...leg, toZone: legs[at - 1]?.toZone || origin.zone } : leg));
    change({ legs: [...zoned, emptyLeg(key)] });
  };
  return (
    <Sheet title="3. Route and payers" lead="One leg for each carrier, in the order in which they move the unit. Each inspects it for itself and takes it only when it is satisfied.">
      {errorOf("legs") && (
        <Notice kind="stop" className="mb-4">
          {errorOf("legs")}
        </Notice>
      )}
      <div className="grid gap-5">
        {legs.map((leg, at) => (
          <LegFields
            key={leg.key}
            leg={leg}
            at={at}
            last={at === legs.length - 1}
            from={legs[at - 1]?.toPlace ?? origin.place}
            to={destination.place}
            ownerName={ownerName}
            errorOf={errorOf}
            onChange={(changed) => put(at, changed)}
            onRemove={legs.length > 1 ? () => change({ legs: legs.filter((one) => one !== leg) }) : null}
          />
        ))}
      </div>
      {legs.length < MOST_LEGS && (
        <Button variant="ghost" className="mt-4" onClick={add}>
          Add the next carrier
        </Button>
      )}
    </Sheet>
  );
}
