import { createHash, randomBytes } from "node:crypto";

const PREFIX = {
  user: "usr", session: "ses", account: "acc", verification: "ver",
  company: "com", invitation: "inv", seat: "sea", follow: "fol",
  draft: "drf", move: "mov", leg: "leg", alias: "als", wait: "wai",
  record: "rec", signature: "sig", outbox: "out", siteLog: "log",
  photo: "pho", prep: "prp", inspection: "isp", finding: "fnd", findingEntry: "fen", acceptance: "apt",
  quote: "quo", feeLine: "fee", payment: "pay", posting: "pst", billing: "bil",
  instruction: "ins", release: "rel", sighting: "sgt", arrival: "arr",
} as const;
export type IdKind = keyof typeof PREFIX;

/** A new id: kind, milliseconds, 64 random bits. Sorts by time and is no secret. */
export function newId(kind: IdKind): string {
  return `${PREFIX[kind]}_${Date.now().toString(16).padStart(12, "0")}${randomBytes(8).toString("hex")}`;
}

/** A secret for a link: 192 random bits, safe in an address. Only its hash is stored. */
export const newToken = () => randomBytes(24).toString("base64url");

/** Hash under which a secret or a body is stored; lower-case hex SHA-256. */
export const sha256Hex = (text: string) => createHash("sha256").update(text).digest("hex");
