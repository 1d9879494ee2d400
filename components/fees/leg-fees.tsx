import { EnteredBy } from "@/components/access/entered-by";
import { Box, BoxGrid } from "@/components/ui/box";
import { LinkButton, TextLink } from "@/components/ui/link-button";
import { State } from "@/components/ui/state";
import type { FeeLeg } from "@/lib/fees/types";
import { legWords, quoteBar } from "@/lib/fees/words";
import { formatWhen } from "@/lib/moves/when";
import { routes } from "@/lib/routes";
import { AgreeDialog } from "./agree-dialog";
import { CreditStep, VoidStep } from "./clerk-steps";
import { PayButton } from "./pay-button";
import { QuotePart, VoidedQuotes } from "./quote-part";

/** The money of one leg: who asks whom, the quote that stands, and the steps that the viewer may take. */
export function LegFees({ moveId, leg }: { moveId: string; leg: FeeLeg }) {
  const { word, tone, who, next } = legWords(leg);
  const settled = tone === "verdigris";
  return (
    <section aria-labelledby={`fees-${leg.legId}`} className="border-2 border-rule-strong">
      <div className="flex flex-wrap items-center justify-between gap-3 border-b border-rule-strong px-3.5 py-2.5">
        <h3 id={`fees-${leg.legId}`} className="text-17 font-[680]">
          Leg {leg.seq}, {leg.carrierName}
        </h3>
        <State tone={tone}>{word}</State>
      </div>
      <BoxGrid framed={false}>
        <Box label="Paid to" detail={`${leg.fromPlace} to ${leg.toPlace}`} span={4}>{leg.carrierName}{leg.carrierMark ? ` (${leg.carrierMark})` : ""}</Box>
        <Box label="Paid by" detail={leg.payerName && !leg.payerSeated ? "named, not invited yet" : null} span={4}>{leg.payerName ?? "Nobody named yet"}</Box>
        <Box label={settled ? "Settled" : "Waiting on"} detail={next} span={4} {...(settled ? {} : { tone: tone === "oxide" ? ("wrong" as const) : ("waiting" as const) })}>{who}</Box>
      </BoxGrid>
      <div className="grid gap-5 border-t border-rule px-3.5 py-4">
        {leg.quote ? <QuotePart quote={leg.quote} zone={leg.fromZone} /> : <NoQuote moveId={moveId} leg={leg} />}
        {leg.cleared?.how === "credit-agreed" && <Credit leg={leg} />}
        <Steps moveId={moveId} leg={leg} />
        <VoidedQuotes quotes={leg.voided} zone={leg.fromZone} />
      </div>
    </section>
  );
}

function NoQuote({ moveId, leg }: { moveId: string; leg: FeeLeg }) {
  return (
    <p className="max-w-[66ch] text-14">
      No quote yet. {leg.payerSeated ? "What the carrier asks for this leg stands here once its billing clerk has given it." : quoteBar(leg)}{" "}
      {!leg.payerSeated && (leg.payerName === null ? <TextLink href={routes.unit(moveId)}>Unit and route</TextLink> : <TextLink href={routes.people(moveId)}>People on this move</TextLink>)}
    </p>
  );
}

function Credit({ leg: { cleared, fromZone } }: { leg: FeeLeg }) {
  if (!cleared) return null;
  return (
    <div className="text-14">
      <p>Credit agreed: {cleared.note}</p>
      {cleared.enteredFor ? (
        <EnteredBy enteredFor={cleared.enteredFor} byName={cleared.by ?? "somebody"} />
      ) : (
        <p className="text-ink-2">
          Said by {cleared.by}, {formatWhen(cleared.at, fromZone)}.
        </p>
      )}
    </div>
  );
}

/** What the viewer may do now, the main step first. */
function Steps({ moveId, leg: { legId, carrierName, quote, cleared, payerSeated, may } }: { moveId: string; leg: FeeLeg }) {
  const agree = quote?.state === "given" && !quote.lapsed && may.agree;
  const pay = quote?.state === "agreed" && may.pay;
  const give = !quote && payerSeated && may.quote;
  const takeBack = quote && quote.state !== "paid" && may.quote;
  const credit = !cleared && may.clear;
  if (!agree && !pay && !give && !takeBack && !credit) return null;
  return (
    <div className="grid gap-4 border-t border-rule pt-4">
      {pay && <PayButton moveId={moveId} quoteId={quote.id} totalCents={quote.totalCents} open={quote.payments.some((one) => one.state === "open")} />}
      <div className="flex flex-wrap gap-2.5">
        {agree && <AgreeDialog moveId={moveId} quote={quote} carrierName={carrierName} />}
        {give && <LinkButton href={routes.quote(moveId, legId)} size="large">{may.quote === "entered" ? "Enter a quote" : "Give a quote"}</LinkButton>}
        {takeBack && <VoidStep moveId={moveId} quote={quote} carrierName={carrierName} step={may.quote} />}
        {credit && <CreditStep moveId={moveId} legId={legId} carrierName={carrierName} step={may.clear} />}
      </div>
    </div>
  );
}
