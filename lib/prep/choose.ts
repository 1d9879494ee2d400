import { PREP_TEMPLATE } from "./template/all";
import type { PrepCondition, PrepFacts, PrepTemplateItem } from "./template/types";
import { PREP_PHASES } from "./vocabulary";

type Fit = { item: PrepTemplateItem; confirmed: number; unknown: number };

/** Null when a known fact rules the condition out; otherwise how many of its facts are confirmed and how many nobody knows. */
function weigh(condition: PrepCondition, facts: PrepFacts): Omit<Fit, "item"> | null {
  const known: Record<string, unknown> = facts;
  let confirmed = 0;
  let unknown = 0;
  for (const [fact, wanted] of Object.entries(condition)) {
    const value = known[fact] ?? null;
    const allowed: readonly unknown[] = Array.isArray(wanted) ? wanted : [wanted];
    if (value === null) unknown += 1;
    else if (allowed.includes(value)) confirmed += 1;
    else return null;
  }
  return { confirmed, unknown };
}

const closerFit = (a: Omit<Fit, "item">, b: Omit<Fit, "item">) => b.confirmed - a.confirmed || a.unknown - b.unknown;

function fitOf(item: PrepTemplateItem, facts: PrepFacts): Fit | null {
  const conditions: readonly PrepCondition[] = item.appliesWhen.length > 0 ? item.appliesWhen : [{}];
  const [best] = conditions
    .map((condition) => weigh(condition, facts))
    .filter((fit) => fit !== null)
    .sort(closerFit);
  return best ? { item, ...best } : null;
}

/**
 * The checklist of one unit, in the order of the work. A line is left out only when a known fact says so; what nobody
 * knows keeps it. Of several lines under one id, the one that the known facts confirm best is used.
 */
export function chooseTemplate(facts: PrepFacts): PrepTemplateItem[] {
  const chosen = new Map<string, Fit>();
  for (const item of PREP_TEMPLATE) {
    const fit = fitOf(item, facts);
    const rival = chosen.get(item.id);
    if (fit && (!rival || closerFit(fit, rival) < 0)) chosen.set(item.id, fit);
  }
  return [...chosen.values()]
    .map((fit) => fit.item)
    .sort((a, b) => PREP_PHASES.indexOf(a.phase) - PREP_PHASES.indexOf(b.phase) || a.order - b.order);
}
