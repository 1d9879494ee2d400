import { type Exchange, readJson, Refusal, sendJson } from "./http";

/** A fault on order. It is forgotten when the stand-in stops. */
export type Fault = {
  kind: string;
  /** How often it still strikes; null until it is turned off. */
  left: number | null;
  ms: number | undefined;
  afterBytes: number | undefined;
  /** Only for this mail address. */
  to: string | undefined;
};

/** The faults that are on order at one stand-in. */
export type Faults = {
  /** The first fault of this kind that fits, counted as used; undefined when none is on order. */
  take(kind: string, fits?: (fault: Fault) => boolean): Fault | undefined;
  isOrdered(kind: string): boolean;
  /** Answers GET and POST /faults; false when the request is for something else. */
  serve(exchange: Exchange): Promise<boolean>;
};

/** Keeps the faults of one stand-in; `kinds` are those that it knows how to make. */
export function openFaults(kinds: readonly string[]): Faults {
  let faults: Fault[] = [];
  return {
    take(kind, fits = () => true) {
      const fault = faults.find((one) => one.kind === kind && fits(one));
      if (!fault) return undefined;
      if (fault.left !== null) fault.left -= 1;
      faults = faults.filter((one) => one.left !== 0);
      return fault;
    },
    isOrdered: (kind) => faults.some((one) => one.kind === kind),
    async serve({ request, response, url, closeIdle }) {
      if (url.pathname !== "/faults") return false;
      if (request.method === "POST") faults = order(faults, kinds, await readJson(request));
      else if (request.method !== "GET") throw new Refusal(405, "GET or POST.");
      sendJson(response, 200, { faults, kinds: [...kinds, "off"] }, { connection: "close" });
      closeIdle();
      return true;
    },
  };
}

function order(faults: Fault[], kinds: readonly string[], body: Record<string, unknown>): Fault[] {
  const { kind } = body;
  if (kind === "off") return [];
  if (typeof kind !== "string" || !kinds.includes(kind)) throw new Refusal(400, `kind is one of ${kinds.join(", ")}, off.`);
  const to = body.to === undefined ? undefined : String(body.to).toLowerCase();
  const left = count(body, "times") ?? null;
  if (left === 0) return faults.filter((fault) => fault.kind !== kind);
  return [...faults, { kind, left, ms: count(body, "ms"), afterBytes: count(body, "afterBytes"), to }];
}

function count(body: Record<string, unknown>, name: string): number | undefined {
  const value = body[name];
  if (value === undefined || value === null) return undefined;
  if (typeof value !== "number" || !Number.isInteger(value) || value < 0) throw new Refusal(400, `${name} is a whole number.`);
  return value;
}
