import { randomUUID } from "node:crypto";
import type { Door, DoorIds } from "../rows/doors";

export type Sent = { method: string; path: string; headers: Record<string, string>; body?: string };
export type Answer = { status: number; type: string; text: string; location: string | null };
/** Brings a request to the doors: over the wire, or straight to their code. */
export type Send = (sent: Sent) => Promise<Answer>;

export const methodOf = ({ door }: Pick<Door, "door">) => door.split(" ")[0] ?? "GET";
export const isWrite = (door: Pick<Door, "door">) => methodOf(door) !== "GET";

/** The path of a door or page with ids in the place of its names. */
export const pathOf = (pattern: string, ids: DoorIds) => pattern.replace(/^[A-Z]+ /, "").replaceAll(/\[(\w+)\]/g, (_all, name: string) => ids[name as keyof DoorIds] ?? `no-${name}`);

/** A write as our own pages send it; `but` changes or, with null, takes away headers. */
export function writeOf(door: Door, ids: DoorIds, origin: string, cookie: string | null, but: { headers?: Record<string, string | null>; body?: string } = {}): Sent {
  const usual: Record<string, string | null> = { origin, "content-type": "application/json", "idempotency-key": randomUUID(), cookie, ...but.headers };
  const headers = Object.fromEntries(Object.entries(usual).filter((entry): entry is [string, string] => entry[1] !== null));
  return { method: methodOf(door), path: pathOf(door.door, ids), headers, body: but.body ?? JSON.stringify(door.body?.(ids) ?? {}) };
}

export const readOf = (pattern: string, ids: DoorIds, cookie: string | null): Sent => ({ method: "GET", path: pathOf(pattern, ids), headers: cookie ? { cookie } : {} });

type Problem = { type?: string; status?: number; title?: string; fields?: Record<string, string[]> };

/** The problem document of an answer, without what differs each time. */
export function problemOf({ type, text }: Answer): Problem | null {
  if (!type.startsWith("application/problem+json")) return null;
  const { instance: _instance, ...rest } = JSON.parse(text) as Problem & { instance?: string };
  return rest;
}
