import { EnteredBy } from "@/components/access/entered-by";
import { Disclosure } from "@/components/ui/disclosure";
import { Notice } from "@/components/ui/notice";
import { State } from "@/components/ui/state";
import type { PaymentView, QuoteView } from "@/lib/fees/types";
import { PAYMENT_TONES, PAYMENT_WORDS, paymentWords } from "@/lib/fees/words";
import { formatDay, formatWhen } from "@/lib/moves/when";
import { QuoteTable } from "./quote-table";

/** A quote as given, who agreed to it, and each try to pay it. */
export function QuotePart({ quote, zone }: { quote: QuoteView; zone: string }) {
  return (
    <div className="grid gap-3">
      <QuoteHead quote={quote} zone={zone} />
      <QuoteTable quote={quote} />
      {quote.note && <p className="max-w-[66ch] text-14 whitespace-pre-line">{quote.note}</p>}
      {quote.enteredFor && <EnteredBy enteredFor={quote.enteredFor} byName={quote.givenBy} />}
      <p className="text-14 text-ink-2">
        {quote.enteredFor ? `Entered here ${formatWhen(quote.givenAt, zone)}. ` : `Given by ${quote.givenBy}, ${formatWhen(quote.givenAt, zone)}. `}
        {quote.agreedBy && quote.agreedAt && `Agreed by ${quote.agreedBy}, ${formatWhen(quote.agreedAt, zone)}.`}
      </p>
      {quote.payments.length > 0 && <PaymentList payments={quote.payments} zone={zone} />}
    </div>
  );
}

function QuoteHead({ quote, zone }: { quote: QuoteView; zone: string }) {
  const more = [quote.reference, `to ${quote.payerName}`, quote.goodUntil && `good until ${formatDay(quote.goodUntil)}`].filter(Boolean).join(", ");
  return (
    <>
      <h4 className="text-15 font-[640]">
        Quote {quote.number} <span className="font-normal text-ink-2">{more}</span>
      </h4>
      {quote.voidedAt && (
        <p className="text-14">
          Voided {formatWhen(quote.voidedAt, zone)}: {quote.voidedWhy}
        </p>
      )}
    </>
  );
}

function PaymentList({ payments, zone }: { payments: PaymentView[]; zone: string }) {
  return (
    <section aria-label="Tries to pay">
      <h5 className="lab mb-1">Payment</h5>
      <ol className="border border-rule">
        {payments.map((payment) => (
          <li key={payment.id} className="grid gap-1.5 border-t border-rule px-3.5 py-2.5 text-14 first:border-t-0">
            <span className="flex flex-wrap items-baseline gap-x-3 gap-y-1">
              <State tone={PAYMENT_TONES[payment.state]}>{PAYMENT_WORDS[payment.state]}</State>
              <span className="min-w-0 grow basis-60">{paymentWords(payment, zone)}</span>
            </span>
            {payment.flags.map((flag) => (
              <Notice key={flag} kind="stop" title="For a billing clerk">
                {flag}
              </Notice>
            ))}
          </li>
        ))}
      </ol>
    </section>
  );
}

/** Quotes that were taken back, out of the way but never gone. */
export function VoidedQuotes({ quotes, zone }: { quotes: QuoteView[]; zone: string }) {
  if (quotes.length === 0) return null;
  return (
    <Disclosure summary={quotes.length === 1 ? "One voided quote" : `${quotes.length} voided quotes`}>
      <div className="grid gap-6 pt-2">
        {quotes.map((quote) => (
          <QuotePart key={quote.id} quote={quote} zone={zone} />
        ))}
      </div>
    </Disclosure>
  );
}
