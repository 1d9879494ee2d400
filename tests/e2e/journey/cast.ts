import type { Browser } from "@playwright/test";
import { aPerson, DESKTOP, PHONE, type Person } from "../support/people";

/** Whoever takes part; `second` inspects, bills and dispatches for the second carrier. */
export const ROLES = ["owner", "contractor", "inspector", "clerk", "desk", "second", "receiver", "payer"] as const;
export type Role = (typeof ROLES)[number];

/** All of them are invented, and so are the companies. */
export const NAMES: Record<Role, string> = {
  owner: "Ottoline Marchbanks", contractor: "Tobias Ingersoll", inspector: "Verity Sandring", clerk: "Quentin Abernale", desk: "Dagny Sorrelquist",
  second: "Magnus Tarnholm", receiver: "Aldous Rivermoor", payer: "Fenella Fenwright",
};
export const COMPANIES = { owner: "Marchbanks Rail Trust", contractor: "Ingersoll Field Mechanical", carrierA: "Quarry & Sandfield", carrierB: "Tarnholm Mountain Lines", receiver: "Rivermoor Shops", payer: "Fenwright Fund" } as const;
export const PLACES = { origin: "Stillwater elevator", from: "Stillwater", interchange: "Ardenne", destination: "Rivermoor shop track", to: "Rivermoor" } as const;

/** The journey so far: what later steps need of earlier ones. */
export type Journey = { people: Record<Role, Person>; unit: string; number: string; moveId: string; legIds: string[]; photoId: string; findingPath: string; followUrl: string };

/** Everybody with a browser of their own; whoever works beside the unit holds a phone. Numbers and addresses are new at every run. */
export async function gather(browser: Browser): Promise<Journey> {
  const run = Date.now().toString().slice(-7);
  const at = (role: Role) => `${role}.${run}@journey.example`;
  const entries = await Promise.all(ROLES.map(async (role) => [role, await aPerson(browser, NAMES[role], at(role), role === "inspector" ? PHONE : DESKTOP)] as const));
  const number = run.slice(-4);
  return { people: Object.fromEntries(entries) as Record<Role, Person>, unit: `ZVRX ${number}`, number, moveId: "", legIds: [], photoId: "", findingPath: "", followUrl: "" };
}

export const everybody = ({ people }: Journey): Person[] => ROLES.map((role) => people[role]);
