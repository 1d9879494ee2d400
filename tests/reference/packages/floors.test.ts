import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";

type Entry = { version?: string; resolved?: string; integrity?: string; inBundle?: boolean; link?: boolean };

const lock = JSON.parse(readFileSync("package-lock.json", "utf8")) as { lockfileVersion: number; packages: Record<string, Entry> };
const entries = Object.entries(lock.packages).filter(([path]) => path !== "");
const nameOf = (path: string) => path.slice(path.lastIndexOf("node_modules/") + "node_modules/".length);

/** The oldest version without a known hole, and the advisory that set it. Looked up on 1 December 2026. */
const FLOORS: [name: string, floor: string, because: string][] = [
  ["next", "16.4.5", "CVE-2026-119346, 119347, 119348, 119350 and GHSA-rhh4-g77r-r9qj; before them CVE-2026-96889 and GHSA-673q-mjm6-r5xr (code run from afar, 16.4.1)"],
  ["react", "19.3.1", "CVE-2026-126187 (code run from afar) and CVE-2026-130165, in the server components of the same release"],
  ["react-dom", "19.3.1", "CVE-2026-126187 and CVE-2026-130165"],
  ["better-auth", "1.7.16", "CVE-2026-134312 to 134315, 134318, 134321, 134322: accounts taken over, one of them on MariaDB alone (134313)"],
  ["drizzle-orm", "0.45.2", "CVE-2026-39356 (GHSA-gpj5-g38j-94v9): names of columns not escaped"],
  ["mysql2", "3.23.1", "GHSA-rgwj-5xj2-c3m3 and GHSA-3f6p-5ww8-9rcr"],
  ["nodemailer", "10.4.1", "CVE-2026-125755: recipients past the allowed ones; before it CVE-2026-121424 and 121425"],
  ["sharp", "0.35.5", "CVE-2026-114111, the same as CVE-2026-96889 (GHSA-wq5f-xc86-pv6w): code run by an SVG"],
  ["uploadthing", "6.7.0", "from 6.7 on the library checks the signature of a callback itself (its documentation)"],
];

/** Packages that read XML: none of our input is XML, and a parser that is not there can't be reached. */
const XML_READERS = /(?:^|[/@_-])(?:xml|xmldom|xpath|sax|saxes|libxml|xml2js|xmlbuilder2?|fast-xml|expat|svgo|soap)(?:[/_.-]|js|2|$)/i;

function compare(one: string, other: string): number {
  const [left, right] = [one, other].map((version) => version.split("-")[0]?.split(".").map(Number) ?? []);
  for (let at = 0; at < 3; at += 1) {
    const difference = (left?.[at] ?? 0) - (right?.[at] ?? 0);
    if (difference !== 0) return difference;
  }
  // A version before the release, such as 1.7.16-beta.1, is older than it.
  return Number(other.includes("-")) - Number(one.includes("-"));
}

it("compares versions as numbers", () => {
  expect(compare("16.4.10", "16.4.5")).toBeGreaterThan(0);
  expect(compare("16.4.5", "16.4.5")).toBe(0);
  expect(compare("0.9.9", "0.45.2")).toBeLessThan(0);
  expect(compare("1.7.16-beta.1", "1.7.16")).toBeLessThan(0);
});

it.each(FLOORS)("every copy of %s is at least %s: %s", (name, floor) => {
  const copies = entries.filter(([path]) => nameOf(path) === name);
  expect(copies.length).toBeGreaterThan(0);
  for (const [path, { version = "0" }] of copies) expect(compare(version, floor), `${path} is ${version}`).toBeGreaterThanOrEqual(0);
});

it("the parts of the sign-in library are as new as itself", () => {
  const version = lock.packages["node_modules/better-auth"]?.version;
  const parts = entries.filter(([path]) => /^@better-auth\/(?!utils$)/.test(nameOf(path)));
  expect(parts.length).toBeGreaterThan(0);
  for (const [path, part] of parts) expect(part.version, path).toBe(version);
});

describe("the lock file", () => {
  it("is of the present form and holds hundreds of packages", () => {
    expect(lock.lockfileVersion).toBe(3);
    expect(entries.length).toBeGreaterThan(300);
  });

  it("names no address to fetch from, and no package from outside a registry", () => {
    expect(entries.filter(([, { resolved, link }]) => resolved !== undefined || link)).toEqual([]);
  });

  it("carries a fingerprint for every package but those packed inside another", () => {
    expect(entries.filter(([, { integrity, inBundle }]) => !inBundle && !/^sha512-[A-Za-z0-9+/]{86}==$/.test(integrity ?? "")).map(([path]) => path)).toEqual([]);
  });

  it("holds nothing that reads XML", () => {
    for (const name of ["fast-xml-parser", "xml2js", "sax", "@xmldom/xmldom", "libxmljs", "xml-js", "node-expat"]) expect(name).toMatch(XML_READERS);
    expect(entries.map(([path]) => nameOf(path)).filter((name) => XML_READERS.test(name))).toEqual([]);
  });
});

it("package.json names exact versions only, so that the lock file decides nothing by itself", () => {
  const { dependencies, devDependencies } = JSON.parse(readFileSync("package.json", "utf8")) as Record<"dependencies" | "devDependencies", Record<string, string>>;
  for (const [name, version] of Object.entries({ ...dependencies, ...devDependencies })) {
    expect(version, name).toMatch(/^\d+\.\d+\.\d+$/);
    expect(lock.packages[`node_modules/${name}`]?.version, name).toBe(version);
  }
});
