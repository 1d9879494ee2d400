/** What one kind of file may import: packages by name, our own files by path without ending, and files of ours as types only. */
export type Kind = { kind: string; file: RegExp; packages: RegExp; own: RegExp; types?: RegExp; serverOnly?: true };

/** Rooms from the ground up. A room may use itself and the rooms before it, never one after it. */
export const ROOMS = [
  "viewer",
  "access",
  "record",
  "outbox",
  "standing",
  "account",
  "companies",
  "parties",
  "moves",
  "evidence",
  "prep",
  "inspections",
  "findings",
  "acceptance",
  "fees",
  "movement",
  "timeline",
  "admin",
] as const;

/** Folders of lib that are no rooms: doors, services and what runs beside the application. */
const BESIDE = "entry|local|worker|mail|payments|uploads";

/** Names with a job of their own; every other file in a room is a pure computation. */
const JOBS = "scope|queries|commands|options|input|viewer|seal";

const INSIDE = String.raw`(?:[a-z0-9-]+\/)*`;
const PURE = String.raw`lib\/(?:errors|routes)|lib\/(?!(?:${BESIDE})\/)[a-z-]+\/(?!(?:queries|commands)\/)${INSIDE}(?!(?:${JOBS})$)[a-z0-9-]+`;
const INPUT = String.raw`lib\/[a-z-]+\/input`;
const DATA = String.raw`lib\/[a-z-]+\/(?:scope|queries|commands)(?:\/[a-z0-9-]+)?`;
const SERVICE = String.raw`lib\/(?:mail|payments|uploads)\/.+`;

const ANY = /./;
const NONE = /^$/;
const only = (...paths: string[]) => new RegExp(`^(?:${paths.join("|")})$`);

/** Packages that no page, screen or door reaches for: data access, sign-in internals, and image work on a server. */
const NOT_FOR_PAGES = /^(?!drizzle|mysql2|better-auth|next\/image|next\/og|sharp|nodemailer|node:child_process)/;

/** A service talks to the world for the rooms, and leaves the database to them. */
const NOT_FOR_SERVICES = /^(?!drizzle|mysql2|better-auth|next\/(?:image|og)$)/;

/** One row for each kind of file; the first that matches counts. */
export const KINDS: readonly Kind[] = [
  { kind: "test", file: /^tests\//, packages: ANY, own: ANY },
  { kind: "configuration", file: /^[a-z]+\.config\.ts$|^next-env\.d\.ts$/, packages: ANY, own: only("\\.next/.+", "components/ui/palette") },
  { kind: "proxy", file: /^proxy\.ts$/, packages: only("next/server", "better-auth/cookies"), own: only("lib/(?:env|routes|errors|doors)") },

  { kind: "table", file: /^db\/schema\//, packages: /^drizzle-orm/, own: only("db/schema/.+", "db/columns", "lib/[a-z-]+/vocabulary"), types: only("lib/[a-z-]+/types") },
  { kind: "database", file: /^db\//, packages: /^(?:drizzle-orm|mysql2|server-only$)/, own: only("db/.+", "lib/env") },

  { kind: "plumbing", file: /^lib\/(?:local|worker)\//, packages: ANY, own: only("lib/.+", "emails/.+", "db/.+") },
  { kind: "environment", file: /^lib\/env\.ts$/, packages: only("zod"), own: NONE },
  { kind: "ids", file: /^lib\/ids\.ts$/, packages: only("node:crypto"), own: NONE },
  {
    kind: "sign-in",
    file: /^lib\/auth\.ts$/,
    packages: /^(?:better-auth|zod$|server-only$|node:crypto$)/,
    own: only(PURE, "db/.+", "lib/(?:env|ids)", "lib/(?:viewer|outbox)/(?:queries|commands)"),
    serverOnly: true,
  },
  { kind: "viewer", file: /^lib\/viewer\/viewer\.ts$/, packages: only("react", "next/headers", "server-only"), own: only(PURE, "lib/auth", "lib/viewer/queries"), serverOnly: true },
  { kind: "seal", file: /^lib\/outbox\/seal\.ts$/, packages: only("node:crypto", "server-only"), own: only("lib/env"), serverOnly: true },
  { kind: "fetcher", file: /^lib\/entry\/fetcher\.ts$/, packages: NONE, own: only("lib/(?:errors|routes)"), types: only("lib/entry/problem") },
  {
    kind: "door",
    file: /^lib\/entry\//,
    packages: /^(?:next\/|zod$|server-only$|node:crypto$)/,
    own: only(PURE, DATA, INPUT, SERVICE, "lib/(?:env|ids|auth)", "lib/entry/.+", "lib/viewer/viewer"),
    serverOnly: true,
  },
  { kind: "service", file: /^lib\/(?:mail|payments|uploads)\//, packages: NOT_FOR_SERVICES, own: only(PURE, SERVICE, "lib/(?:env|ids)", "emails/.+") },

  {
    kind: "data",
    file: /^lib\/[a-z-]+\/(?:scope|queries|commands)(?:\/[a-z0-9-]+)?\.ts$/,
    packages: only("drizzle-orm(?:/.+)?", "zod", "server-only", "node:crypto"),
    own: only(PURE, DATA, INPUT, SERVICE, "db/.+", "lib/(?:env|ids|auth)", "lib/outbox/seal"),
    serverOnly: true,
  },
  { kind: "options", file: /^lib\/[a-z-]+\/options\.ts$/, packages: only("@tanstack/react-query"), own: only(PURE, "lib/[a-z-]+/options", "lib/entry/fetcher"), types: only(INPUT) },
  { kind: "input", file: /^lib\/[a-z-]+\/input\.ts$/, packages: only("zod"), own: only(PURE, INPUT) },
  { kind: "trade", file: /^lib\/trade\//, packages: /^(?:date-fns|@date-fns\/tz$)/, own: only("lib/trade/.+") },
  { kind: "pure", file: /^lib\//, packages: /^(?:date-fns|@date-fns\/tz$)/, own: only(PURE), types: only(INPUT) },

  { kind: "primitive", file: /^components\/ui\//, packages: only("react", "react-dom", "clsx", "next/(?:link|form|navigation)"), own: only("components/ui/.+") },
  {
    kind: "component",
    file: /^components\//,
    packages: only("react", "react-dom", "clsx", "next/(?:link|form|navigation|dynamic)", "@tanstack/react-(?:query|table)", "@uploadthing/react", "exifr"),
    own: only(PURE, "components/.+", "lib/[a-z-]+/options", "lib/entry/fetcher"),
    types: only(INPUT, "lib/entry/.+", SERVICE),
  },
  { kind: "e-mail", file: /^emails\//, packages: /^(?:react$|@react-email\/)/, own: only(PURE, "emails/.+") },
  { kind: "page", file: /^app\//, packages: NOT_FOR_PAGES, own: only("app/.+", "components/.+", `lib/(?!(?:local|worker)/).+`) },
];

/** The kind of a file; null when no row covers it. */
export const kindOf = (path: string): Kind | null => KINDS.find((row) => row.file.test(path)) ?? null;

/** Where a file's room stands in the order; null outside the rooms. */
export function roomOf(path: string): number | null {
  const index = ROOMS.findIndex((room) => path.startsWith(`lib/${room}/`));
  return index < 0 ? null : index;
}
