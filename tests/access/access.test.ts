import { afterAll, describe, expect, it } from "vitest";
import { AppError } from "@/lib/errors";
import { unsafeFollow } from "@/lib/timeline/queries";
import { openBench } from "../integration/fees/bench";
import { withDatabase } from "../support/database";
import { rich } from "./build";
import { fingerprint } from "./fingerprint";
import { OUTSIDE, SEATED, type Persona } from "./personas";
import { FOLLOW_TOKEN } from "./rich";
import type { Ready, Row } from "./row";
import { leaksIn, saidBy } from "./secrets";
import { TABLE } from "./table";

const bench = await openBench();
withDatabase({ STRIPE_API_BASE: bench.url });
afterAll(() => bench.close());

type Outcome = PromiseSettledResult<unknown>;

const settle = async (work: Promise<unknown>): Promise<Outcome> => (await Promise.allSettled([work]))[0];

const codeOf = (outcome: Outcome): string => (outcome.status === "fulfilled" ? "done" : outcome.reason instanceof AppError ? outcome.reason.code : `broken (${String(outcome.reason)})`);

/** Texts of the rich case's secrets that somebody who may has really read: a secret that nobody finds would prove nothing. */
const read = new Set<string>();

/** Asks as one persona; every sentence that comes back is a fault. */
async function ask(ready: Ready, persona: Persona, judge: (outcome: Outcome) => string | null): Promise<string[]> {
  const outcome = await settle(ready.call(ready.people[persona]));
  const fault = judge(outcome);
  const said = saidBy(outcome);
  for (const { may, texts } of ready.secrets) if (may.includes(persona)) for (const text of texts) if (said.includes(text)) read.add(text);
  return [...(fault ? [fault] : []), ...leaksIn(outcome, persona, ready.secrets)];
}

const expectCode = (persona: Persona, code: string) => (outcome: Outcome) => (codeOf(outcome) === code ? null : `${persona} gets ${codeOf(outcome)} instead of ${code}: ${saidBy(outcome).slice(0, 200)}`);

async function askAll(personas: readonly Persona[], one: (persona: Persona) => Promise<string[]>): Promise<string[]> {
  const faults: string[] = [];
  for (const persona of personas) faults.push(...(await one(persona)));
  return faults;
}

/** Nothing of what was refused may have been written. */
async function leavesAllAsItWas(row: Row, run: () => Promise<string[]>): Promise<string[]> {
  if (row.reads) return run();
  const before = await fingerprint();
  const faults = await run();
  return (await fingerprint()) === before ? faults : [...faults, "what was refused has changed rows"];
}


const outside = ({ right, hidden }: Row): Persona[] => [...OUTSIDE.filter((one) => !right.includes(one)), ...hidden];
const wrong = ({ right, hidden, empty }: Row): Persona[] => SEATED.filter((one) => ![...right, ...hidden, ...empty].includes(one));

/** Refused, and in the words in which an id of nothing is refused. */
async function learnsNothing(row: Row, ready: Ready, persona: Persona): Promise<string[]> {
  const ofNothing = saidBy(await settle(ready.callStrange(ready.people[persona], persona)));
  return ask(ready, persona, (outcome) => {
    const fault = expectCode(persona, row.told[persona] ?? row.hiddenCode)(outcome);
    return fault ?? (saidBy(outcome) === ofNothing ? null : `${persona} can tell it from an id of nothing: ${saidBy(outcome)} instead of ${ofNothing}`);
  });
}

/** In a list that is open to all, the needle is found by those who may and by nobody else. */
const findsNeedle = (row: Row, ready: Ready, persona: Persona) => (outcome: Outcome) => {
  const expected = ready.needle === null || row.right.includes(persona);
  if (codeOf(outcome) !== "done") return expectCode(persona, "done")(outcome);
  return ready.needle === null || saidBy(outcome).includes(ready.needle) === expected ? null : `${persona} ${expected ? "misses" : "finds"} ${ready.needle}`;
};

async function succeeds(row: Row, persona: Persona): Promise<string[]> {
  const ready = await row.prepare();
  const faults = await ask(ready, persona, expectCode(persona, "done"));
  return row.named ? [...faults, ...(await knowsNothingStrange(row, ready, persona))] : faults;
}

/** Whoever may do it on their own case is refused an id of nothing as an outsider is. */
async function knowsNothingStrange(row: Row, ready: Ready, persona: Persona): Promise<string[]> {
  const fault = expectCode(persona, row.hiddenCode)(await settle(ready.callStrange(ready.people[persona], "outsider")));
  return fault ? [`${fault} (for ids of nothing)`] : [];
}

for (const [room, rows] of Object.entries(TABLE)) {
  describe(room, () => {
    for (const row of rows) {
      describe([row.name, row.as].filter(Boolean).join(", "), () => {
        if (row.open) {
          it("tells everybody of their own alone", async () => {
            const ready = await row.prepare();
            expect(await askAll([...SEATED, ...OUTSIDE], (persona) => ask(ready, persona, findsNeedle(row, ready, persona)))).toEqual([]);
          });
          return;
        }
        if (outside(row).length > 0) it("tells nobody outside that there is such a thing", async () => {
          const ready = await row.prepare();
          expect(await leavesAllAsItWas(row, () => askAll(outside(row), (persona) => learnsNothing(row, ready, persona)))).toEqual([]);
        });
        if (wrong(row).length > 0) it("refuses every wrong part", async () => {
          const ready = await row.prepare();
          expect(await leavesAllAsItWas(row, () => askAll(wrong(row), (persona) => ask(ready, persona, expectCode(persona, row.wrongCode))))).toEqual([]);
        });
        if (row.empty.length > 0) it("gives nothing to whom it does not concern", async () => {
          const ready = await row.prepare();
          expect(await askAll(row.empty, (persona) => ask(ready, persona, (outcome) => (saidBy(outcome) === "null" ? null : `${persona} gets ${saidBy(outcome)}`)))).toEqual([]);
        });
        if (row.right.length > 0) it("is done by every right part", async () => {
          expect(await askAll(row.right, (persona) => succeeds(row, persona))).toEqual([]);
        });
      });
    }
  });
}

it("every secret of the rich case is found by somebody who may read it", async () => {
  const { secrets } = await rich();
  const unread = secrets.filter(({ may, texts }) => may.length > 0 && !texts.some((text) => read.has(text)));
  expect(unread.map(({ what }) => what)).toEqual([]);
});

it("a link to follow tells of no person, no money and no other secret", async () => {
  const { people, secrets } = await rich();
  const said = JSON.stringify(await unsafeFollow(FOLLOW_TOKEN, new Date()));
  expect(said).toContain("Quillan & Sandbar");
  const names = Object.values(people).map(({ name }) => name);
  expect([...names, ...secrets.flatMap(({ texts }) => texts)].filter((text) => said.includes(text))).toEqual([]);
});
