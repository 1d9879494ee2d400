import { createAccount, ownAccount } from "./accounts";
import { expand, page, under } from "./answers";
import { ApiError } from "./api-error";
import { type Books, need, newestEvents, type Scope } from "./books";
import type { Form } from "./form";
import { type Draft, refund } from "./money";
import { accountParams, eventListParams, noParams, pagingParams, refundListParams, refundParams, sessionListParams, sessionParams } from "./params";
import { createSession, expireSession } from "./sessions";

/** One call of the API: what was sent, for whom, and when in seconds. */
export type Call = {
  books: Books;
  scope: Scope;
  now: number;
  form: Form;
  pageOf(sessionId: string): string;
  tell(drafts: readonly Draft[]): void;
};

type Run = (call: Call, id: string) => object;

const one =
  (find: (call: Call, id: string) => object): Run =>
  (call, id) => {
    const params = noParams(call.form, "");
    return expand(call.books, find(call, id), params.expand);
  };

/** The calls that the service answers; `:id` stands for any id. */
const CALLS: Record<string, Run> = {
  "POST /v1/checkout/sessions"(call) {
    const params = sessionParams(call.form, "");
    const { object } = createSession({ books: call.books, scope: call.scope, now: call.now, urlOf: call.pageOf }, params);
    return expand(call.books, object, params.expand);
  },
  "GET /v1/checkout/sessions"({ books, scope, form }) {
    const { payment_intent: intent, status, ...paging } = sessionListParams(form, "");
    const found = under(books.sessions.all(), scope).filter((session) => (!intent || session.payment_intent === intent) && (!status || session.status === status));
    return page(found, "/v1/checkout/sessions", paging);
  },
  "GET /v1/checkout/sessions/:id": one(({ books, scope }, id) => need(books.sessions, id, scope, "checkout.session", "session").object),
  "GET /v1/checkout/sessions/:id/line_items"({ books, scope, form }, id) {
    const { lines } = need(books.sessions, id, scope, "checkout.session", "session");
    return page(lines, `/v1/checkout/sessions/${id}/line_items`, pagingParams(form, ""));
  },
  "POST /v1/checkout/sessions/:id/expire"(call, id) {
    const params = noParams(call.form, "");
    const { object, scope } = expireSession(call.books, need(call.books.sessions, id, call.scope, "checkout.session", "session"));
    call.tell([{ type: "checkout.session.expired", object, scope }]);
    return expand(call.books, object, params.expand);
  },
  "GET /v1/payment_intents/:id": one(({ books, scope }, id) => need(books.intents, id, scope, "payment_intent", "intent").object),
  "GET /v1/charges/:id": one(({ books, scope }, id) => need(books.charges, id, scope, "charge").object),
  "POST /v1/refunds"(call) {
    const params = refundParams(call.form, "");
    const done = refund(call.books, call.scope, params, call.now);
    call.tell(done.drafts);
    return expand(call.books, done.refund, params.expand);
  },
  "GET /v1/refunds"({ books, scope, form }) {
    const { payment_intent: intent, charge, ...paging } = refundListParams(form, "");
    const found = under(books.refunds.all(), scope).filter((one) => (!intent || one.payment_intent === intent) && (!charge || one.charge === charge));
    return page(found, "/v1/refunds", paging);
  },
  "GET /v1/refunds/:id": one(({ books, scope }, id) => need(books.refunds, id, scope, "refund").object),
  "POST /v1/accounts"(call) {
    const params = accountParams(call.form, "");
    return expand(call.books, createAccount(call.books, params, call.now), params.expand);
  },
  "GET /v1/accounts": ({ books, form }) => page(under(books.accounts.all(), null), "/v1/accounts", pagingParams(form, "")),
  "GET /v1/accounts/:id": one(({ books }, id) => need(books.accounts, id, null, "account").object),
  "GET /v1/account": one(({ now }) => ownAccount(now)),
  "GET /v1/events"({ books, scope, form }) {
    const { type, types = type ? [type] : undefined, delivery_success: delivered, ...paging } = eventListParams(form, "");
    const records = newestEvents(books).filter((record) => delivered === undefined || (record.state === "delivered") === delivered);
    const found = under(records, scope).filter((event) => !types || types.includes(event.type));
    return page(found, "/v1/events", paging);
  },
  "GET /v1/events/:id": one(({ books, scope }, id) => need(books.events, id, scope, "event").object),
};

const ROUTES = Object.entries(CALLS).map(([name, run]) => ({ pattern: new RegExp(`^${name.replace(":id", "([\\w-]+)")}$`), run }));

/** Does what a call asks, or throws the service's error. */
export function answerCall(call: Call, method: string, path: string): object {
  for (const { pattern, run } of ROUTES) {
    const found = pattern.exec(`${method} ${path}`);
    if (found) return run(call, found[1] ?? "");
  }
  throw new ApiError(404, { message: `Unrecognized request URL (${method}: ${path}). The stand-in plays only a part of the API.` });
}
