"use client";

import { useState } from "react";
import { EnteredBy } from "@/components/access/entered-by";
import { Button } from "@/components/ui/button";
import { Disclosure } from "@/components/ui/disclosure";
import { LinkButton, TextLink } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { TickBox } from "@/components/ui/tick-box";
import type { AcceptanceLeg, AcceptanceView } from "@/lib/acceptance/types";
import { formatDay, formatWhen } from "@/lib/moves/when";
import { routes } from "@/lib/routes";
import { RestrictionList } from "./restriction-list";
import { WithdrawDialog } from "./withdraw-dialog";

/** Where the acceptance of one leg stands: signed and under which terms, or what is missing. */
export function AcceptanceBlock({ moveId, leg }: { moveId: string; leg: AcceptanceLeg }) {
  return (
    <div>
      <h3 className="mb-2 text-15 font-[680]">Acceptance by {leg.carrierName}</h3>
      {leg.standing ? <Standing moveId={moveId} leg={leg} acceptance={leg.standing} /> : <NotYet moveId={moveId} leg={leg} />}
      {leg.withdrawn.length > 0 && (
        <Disclosure summary={leg.withdrawn.length === 1 ? "One was withdrawn" : `${leg.withdrawn.length} were withdrawn`} className="mt-4">
          <ul className="grid gap-3 text-14">
            {leg.withdrawn.map((one) => (
              <li key={one.id}>
                {one.enteredFor ? "Entered" : "Signed"} by {one.name} {formatWhen(one.at, leg.zone)}, withdrawn {one.withdrawnAt && formatWhen(one.withdrawnAt, leg.zone)}: {one.withdrawnWhy}
              </li>
            ))}
          </ul>
        </Disclosure>
      )}
    </div>
  );
}

function Standing({ moveId, leg, acceptance }: { moveId: string; leg: AcceptanceLeg; acceptance: AcceptanceView }) {
  const [withdrawing, setWithdrawing] = useState(false);
  return (
    <div className="grid gap-3 text-14">
      <p className="flex gap-3">
        <TickBox state="done" silent />
        <span>
          <span className="font-[620] text-verdigris">{acceptance.enteredFor ? "Accepted, as entered" : "Accepted"}</span>
          {acceptance.number && <>, no. <span className="figure">{acceptance.number}</span></>}
          {!acceptance.enteredFor && <span className="block text-ink-2">Signed by {acceptance.name}, {formatWhen(acceptance.at, leg.zone)}</span>}
        </span>
      </p>
      {acceptance.enteredFor && <EnteredBy enteredFor={acceptance.enteredFor} byName={acceptance.name} />}
      {acceptance.expired && <Notice kind="stop" title="Past its day">It was valid until {acceptance.validUntil && formatDay(acceptance.validUntil)}. Ask the carrier before anything moves.</Notice>}
      {acceptance.changed && <Notice title="Changed since it was signed">A finding or the prep that it covers is no longer as it was then. Look at what changed before you rely on it.</Notice>}
      <RestrictionList restrictions={acceptance.restrictions} note={acceptance.restrictionNote} />
      {acceptance.validUntil && !acceptance.expired && <p>Valid until {formatDay(acceptance.validUntil)}.</p>}
      <Disclosure summary={acceptance.enteredFor ? "What was entered" : "What was signed"}>
        <p>{acceptance.statement}</p>
      </Disclosure>
      {leg.mayWithdraw && (
        <div>
          <Button variant="ghost" size="small" onClick={() => setWithdrawing(true)}>Withdraw…</Button>
          <WithdrawDialog moveId={moveId} leg={leg} acceptanceId={acceptance.id} open={withdrawing} onClose={() => setWithdrawing(false)} />
        </div>
      )}
    </div>
  );
}

function NotYet({ moveId, leg }: { moveId: string; leg: AcceptanceLeg }) {
  const stopping = leg.findings.filter(({ severity, state }) => severity === "stops-move" && (state === "open" || state === "answered"));
  return (
    <div className="grid gap-3 text-14">
      {leg.lapsed?.validUntil && <Notice kind="stop" title="It ran out">The acceptance signed by {leg.lapsed.name} was valid until {formatDay(leg.lapsed.validUntil)}. It is signed again before the carrier takes the unit.</Notice>}
      {leg.missing.length > 0 ? (
        <>
          <p>Not signed. Before it can be:</p>
          <ul className="border-t border-rule">
            {leg.missing.map((one) => (
              <li key={one} className="flex gap-3 border-b border-rule py-2.5">
                <TickBox state="waiting" />
                <span>{one}</span>
              </li>
            ))}
          </ul>
          {stopping.length > 0 && (
            <ul className="grid gap-1">
              {stopping.map(({ id, label, component }) => (
                <li key={id}>
                  <TextLink href={routes.finding(moveId, id)} className="inline-flex min-h-6 items-center max-sm:min-h-11">{label}, {component}</TextLink>
                </li>
              ))}
            </ul>
          )}
        </>
      ) : (
        <p>{leg.takenOver ? "None stands, and the carrier has the unit." : "Not signed. Nothing that the acceptance depends on is open."}</p>
      )}
      {leg.maySign && leg.missing.length === 0 && (
        <div>
          <LinkButton href={routes.accept(moveId, leg.legId)}>{leg.maySign === "enter" ? "Enter the acceptance…" : "Sign the acceptance…"}</LinkButton>
        </div>
      )}
      <p className="text-13 text-ink-2 max-sm:text-14">The inspector accepts the unit’s mechanical fitness for this leg alone. Money has no say in it.</p>
    </div>
  );
}
