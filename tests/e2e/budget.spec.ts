import { expect, test, type Page } from "@playwright/test";
import { gzipSync } from "node:zlib";
import { pageAs } from "./support/demo";
import { findWorld, PAGES, type PageRow } from "./support/pages";

const KB = 1000;
/** All script of a page, and what of it is ours beyond what every page of the framework has; both gzipped. */
const MOST_BYTES = 190 * KB;
const MOST_OWN_BYTES = 55 * KB;
/** Words that outlive minifying, by the library that they tell of. */
const MARKS = { zod: /\$ZodType|ZodError/, table: /table_getAllLeafColumns/, sending: /x-uploadthing-version/ } as const;

type Chunk = { bytes: number; text: string };
/** The scripts that the HTML of a page names, and those that the page fetches by itself afterwards. */
type Load = { file: string; first: string[]; later: string[] };

const chunks = new Map<string, Chunk>();

/** Keeps a script as it travels. */
async function keepChunk(page: Page, path: string): Promise<void> {
  if (chunks.has(path)) return;
  const answer = await page.request.get(path);
  expect(answer.status(), path).toBe(200);
  const text = await answer.text();
  chunks.set(path, { bytes: gzipSync(text).byteLength, text });
}

/** What script a page brings; a browser that knows modules leaves out what is for the others. */
async function loadOf(page: Page, file: string, path: string): Promise<Load> {
  const asked = new Set<string>();
  page.on("request", (request) => {
    if (request.resourceType() === "script") asked.add(new URL(request.url()).pathname);
  });
  const answer = await page.goto(path, { waitUntil: "networkidle" });
  const html = (await answer?.text()) ?? "";
  const first = [...html.matchAll(/<script\b[^>]*\bsrc="([^"]+)"[^>]*>/g)].filter(([tag]) => !/nomodule/i.test(tag)).flatMap(([, src]) => src ?? []);
  for (const script of new Set([...first, ...asked])) await keepChunk(page, script);
  return { file, first: [...new Set(first)], later: [...asked].filter((script) => !first.includes(script)) };
}

const sizeOf = (scripts: readonly string[]) => scripts.reduce((sum, path) => sum + (chunks.get(path)?.bytes ?? 0), 0);
const kb = (bytes: number) => (bytes / KB).toFixed(1).padStart(6);

/** One page of each file, as the first row has it. */
const firstRows = (): PageRow[] => PAGES.filter((row, at) => PAGES.findIndex(({ file }) => file === row.file) === at && !row.status);

test("No page brings more script than its budget, nor libraries that only others need", async ({ browser }) => {
  test.setTimeout(300_000);
  const world = await findWorld(browser);
  const loads: Load[] = [];
  for (const row of firstRows()) {
    // A browser of its own each time, so that nothing is there from the page before.
    const page = await pageAs(browser, row.who);
    loads.push(await loadOf(page, row.file, row.path(world)));
    await page.context().close();
  }
  const base = (loads[0]?.first ?? []).filter((path) => loads.every(({ first }) => first.includes(path)));
  const rows = loads.map((load) => ({ ...load, all: sizeOf(load.first), own: sizeOf(load.first) - sizeOf(base) }));
  const lines = rows.toSorted((one, other) => other.all - one.all).map(({ file, all, own, later }) => `${kb(all)} ${kb(own)} ${kb(sizeOf(later))}  ${file}`);
  console.log(["Script in kB, gzipped: with the page, of that ours, and what comes later", ...lines, `${kb(sizeOf(base))} is the base of all pages`].join("\n"));
  expect(rows.filter(({ all, own }) => all > MOST_BYTES || own > MOST_OWN_BYTES).map(({ file, all, own }) => `${file}: ${kb(all)}, ours ${kb(own)}`)).toEqual([]);
  const having = (mark: RegExp) => rows.filter(({ first, later }) => [...first, ...later].some((path) => mark.test(chunks.get(path)?.text ?? ""))).map(({ file }) => file);
  expect(having(MARKS.zod), "pages with zod").toEqual([]);
  expect(having(MARKS.table), "pages with the table library").toEqual(["app/(desk)/moves/page.tsx"]);
  const early = rows.filter(({ first }) => first.some((path) => MARKS.sending.test(chunks.get(path)?.text ?? ""))).map(({ file }) => file);
  expect(early, "pages that bring the upload library before anybody takes a photo").toEqual([]);
});
