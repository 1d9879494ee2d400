import type { ServerResponse } from "node:http";
import { escape, sendPage } from "../page";
import type { SessionRecord } from "./books";

const NOTE = "This is the payment stand-in on this machine. No card is asked for and no money moves.";

/** Money as people write it; the smallest unit differs by currency. */
export function amountText(amount: number, currency: string): string {
  const format = new Intl.NumberFormat("en-US", { style: "currency", currency });
  return format.format(amount / 10 ** (format.resolvedOptions().maximumFractionDigits ?? 2));
}

/** The checkout: what is to be paid, and three ways on. */
export function sendCheckout(response: ServerResponse, { object, lines }: SessionRecord, declined: boolean): void {
  const currency = object.currency ?? "usd";
  const total = amountText(object.amount_total ?? 0, currency);
  const rows = lines.map((line) => {
    const count = line.quantity !== null && line.quantity > 1 ? ` <small>× ${line.quantity}</small>` : "";
    return `<p class="items"><span>${escape(line.description ?? "")}${count}</span><span class="end money">${escape(amountText(line.amount_total, currency))}</span></p>`;
  });
  const email = object.customer_email
    ? `<p class="items"><span>Receipt to</span><span class="end">${escape(object.customer_email)}</span></p>`
    : '<p><label>E-mail for the receipt<input name="email" type="email" autocomplete="email"></label></p>';
  const body = `<h1>Payment</h1>
${declined ? '<p class="bad" role="alert">The card was declined. Nothing was paid.</p>' : ""}
<form method="post" action="/pay/${object.id}"><div class="sheet">${rows.join("")}<p class="items"><strong>Total</strong><strong class="end money amount">${escape(total)}</strong></p>${email}</div>
<div class="stack"><button class="main" name="action" value="pay">Pay ${escape(total)}</button>
<button name="action" value="decline">Decline</button>
${object.cancel_url ? `<a class="button" href="${escape(object.cancel_url)}">Leave</a>` : ""}</div></form>
<p class="hint">Pay acts like a card that is accepted, Decline like one that is refused. Leave goes back without paying.</p>`;
  const formTargets = [object.success_url, object.cancel_url].filter((url) => url !== null).map((url) => new URL(url).origin);
  sendPage(response, { title: `Pay ${total}`, note: NOTE, body, narrow: true, formTargets });
}

/** A checkout that is over: paid, or past its time. */
export function sendClosed(response: ServerResponse, { object }: SessionRecord): void {
  const paid = object.status === "complete";
  const back = paid ? (object.success_url ?? "").replaceAll("{CHECKOUT_SESSION_ID}", object.id) : object.cancel_url;
  const body = `<h1>${paid ? "This is paid" : "This payment page has expired"}</h1>
<p>${paid ? '<span class="good">Nothing more is due.</span>' : "Nothing was paid. Start again from where you came."}</p>
${back ? `<p><a class="button" href="${escape(back)}">Go back</a></p>` : ""}`;
  sendPage(response, { status: paid ? 200 : 410, title: paid ? "Paid" : "Expired", note: NOTE, body, narrow: true });
}

/** No such checkout. */
export function sendUnknown(response: ServerResponse): void {
  sendPage(response, { status: 404, title: "No such payment page", note: NOTE, body: "<h1>No such payment page</h1>", narrow: true });
}
