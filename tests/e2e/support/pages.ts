import type { Browser, Page } from "@playwright/test";
import type { DemoKey } from "@/lib/local/demo-people";
import { routes } from "@/lib/routes";
import { companyOf, demoCase, pageAs, type DemoCase } from "./demo";
import type { PeopleView } from "@/lib/parties/types";
import { readDoor, writeDoor } from "./doors";
import { letterTo, linkIn } from "./mail";

/** What of the demo the pages are opened with. `moving` is under way, `absent` has a carrier that is not on board, `closed` is over, `fresh` was just opened. */
export type World = Record<"moving" | "absent" | "closed" | "fresh", DemoCase> & { companyId: string; draftId: string; joinPath: string; followPath: string };

/** A page as the person sees it who uses it; `open` brings up what stands behind a press. */
export type PageRow = { file: string; who: DemoKey | null; path: (world: World) => string; what?: string; open?: (page: Page) => Promise<void>; status?: 404 };

const NO_TOKEN = "not-a-token-that-anybody-was-given";
const [desk, front] = ["app/(desk)/", "app/(front)/"];
const moving = (path: (moveId: string) => string) => ({ moving: { moveId } }: World) => path(moveId);
const nextLeg = ({ moving: { legIds } }: World) => legIds[1] ?? "";
const press = (name: string | RegExp) => async (page: Page) => page.getByRole("main").getByRole("button", { name }).first().click();
const unfold = async (page: Page) => {
  for (const fold of await page.locator("main details:not([open]) > summary").all()) if (await fold.isVisible()) await fold.click();
};

const FRONT: readonly PageRow[] = [
  { file: `${front}page.tsx`, who: null, path: routes.home },
  { file: `${front}sign-in/page.tsx`, who: null, path: () => routes.signIn() },
  { file: `${front}sign-in/page.tsx`, who: null, path: () => routes.signIn(), what: "with faults", open: press("Sign in") },
  { file: `${front}sign-in/link/page.tsx`, who: null, path: routes.signInLink },
  { file: `${front}sign-up/page.tsx`, who: null, path: routes.signUp },
  { file: `${front}check-mail/page.tsx`, who: null, path: () => routes.checkMail("sign-up"), open: unfold },
  { file: `${front}forgot-password/page.tsx`, who: null, path: routes.forgotPassword },
  { file: `${front}reset/[token]/page.tsx`, who: null, path: () => routes.resetPassword(NO_TOKEN) },
  { file: `${front}verify/[token]/page.tsx`, who: null, path: () => routes.verifyAddress(NO_TOKEN) },
  { file: `${front}enter/[token]/page.tsx`, who: null, path: () => routes.enter(NO_TOKEN) },
  { file: `${front}join/[token]/page.tsx`, who: null, path: (world) => world.joinPath },
  { file: `${front}join/[token]/page.tsx`, who: "desk", path: (world) => world.joinPath, what: "as somebody else" },
  { file: `${front}join/[token]/page.tsx`, who: null, path: () => routes.join(NO_TOKEN), what: "used up" },
  { file: `${front}follow/[token]/page.tsx`, who: null, path: (world) => world.followPath },
];

const DESK: readonly PageRow[] = [
  { file: `${desk}moves/page.tsx`, who: "owner", path: routes.moves },
  { file: `${desk}moves/page.tsx`, who: "receiver", path: () => `${routes.moves()}?q=nothing-like-this`, what: "nothing found" },
  { file: `${desk}moves/new/page.tsx`, who: "owner", path: routes.newMove, open: unfold },
  { file: `${desk}moves/new/page.tsx`, who: "owner", path: routes.newMove, what: "with faults", open: press("Open the move") },
  { file: `${desk}moves/new/[draftId]/page.tsx`, who: "owner", path: (world) => routes.draft(world.draftId) },
  { file: `${desk}account/page.tsx`, who: "owner", path: routes.account },
  { file: `${desk}account/companies/page.tsx`, who: "clerk", path: routes.companies },
  { file: `${desk}account/companies/new/page.tsx`, who: "owner", path: routes.newCompany },
  { file: `${desk}account/companies/[companyId]/page.tsx`, who: "clerk", path: (world) => routes.company(world.companyId) },
  { file: `${desk}admin/page.tsx`, who: "admin", path: routes.admin },
  { file: `${desk}admin/companies/page.tsx`, who: "admin", path: routes.adminCompanies },
  { file: `${desk}admin/people/page.tsx`, who: "admin", path: routes.adminPeople },
  { file: `${desk}admin/mail/page.tsx`, who: "admin", path: routes.adminMail },
];

const CASE = `${desk}moves/[moveId]/`;

const OF_A_CASE: readonly PageRow[] = [
  { file: `${CASE}page.tsx`, who: "owner", path: moving(routes.move), open: unfold },
  { file: `${CASE}page.tsx`, who: "contractor", path: ({ absent: { moveId } }) => routes.move(moveId), what: "carrier not on board" },
  { file: `${CASE}prep/page.tsx`, who: "contractor", path: moving(routes.prep), open: unfold },
  { file: `${CASE}prep/page.tsx`, who: "owner", path: ({ fresh: { moveId } }) => routes.prep(moveId), what: "nothing done", open: (page) => page.getByRole("button", { name: /^To do/ }).first().click() },
  { file: `${CASE}prep/page.tsx`, who: "receiver", path: ({ closed: { moveId } }) => routes.prep(moveId), what: "put back" },
  { file: `${CASE}findings/page.tsx`, who: "inspector", path: moving(routes.findings), open: unfold },
  { file: `${CASE}findings/[findingId]/page.tsx`, who: "contractor", path: ({ moving: { moveId, findingIds } }) => routes.finding(moveId, findingIds[0] ?? "") },
  { file: `${CASE}findings/[findingId]/page.tsx`, who: "nextInspector", path: ({ moving: { moveId, findingIds } }) => routes.finding(moveId, findingIds[3] ?? ""), what: "replying", open: press("Not cleared…") },
  { file: `${CASE}findings/[findingId]/page.tsx`, who: "contractor", path: ({ moving: { moveId, findingIds } }) => routes.finding(moveId, findingIds[1] ?? ""), what: "a photo, big", open: press(/^Photo gap/) },
  { file: `${CASE}findings/visit/page.tsx`, who: "nextInspector", path: (world) => routes.visit(world.moving.moveId, nextLeg(world)) },
  { file: `${CASE}findings/new/page.tsx`, who: "nextInspector", path: ({ moving: { moveId, inspectionIds } }) => routes.postFinding(moveId, inspectionIds.at(-1) ?? "") },
  { file: `${CASE}findings/new/page.tsx`, who: "nextInspector", path: ({ moving: { moveId, inspectionIds } }) => routes.postFinding(moveId, inspectionIds.at(-1) ?? ""), what: "with faults", open: press("Post the finding") },
  { file: `${CASE}findings/accept/[legId]/page.tsx`, who: "nextInspector", path: (world) => routes.accept(world.moving.moveId, nextLeg(world)) },
  { file: `${CASE}findings/accept/[legId]/page.tsx`, who: "owner", path: ({ absent: { moveId, legIds } }) => routes.accept(moveId, legIds[0] ?? ""), what: "entered for the carrier" },
  { file: `${CASE}fees/page.tsx`, who: "payer", path: moving(routes.fees) },
  { file: `${CASE}fees/page.tsx`, who: "owner", path: moving(routes.fees), what: "agreeing", open: press(/^Agree to quote/) },
  { file: `${CASE}fees/paid/page.tsx`, who: "payer", path: ({ moving: { moveId, sessionIds } }) => `${routes.paid(moveId)}?session=${sessionIds[0] ?? ""}` },
  { file: `${CASE}fees/quote/[legId]/page.tsx`, who: "owner", path: ({ absent: { moveId, legIds } }) => routes.quote(moveId, legIds[0] ?? "") },
  { file: `${CASE}movement/page.tsx`, who: "desk", path: moving(routes.movement), open: press("Record a sighting") },
  { file: `${CASE}movement/page.tsx`, who: "receiver", path: ({ closed: { moveId } }) => routes.movement(moveId), what: "over" },
  { file: `${CASE}timeline/page.tsx`, who: "receiver", path: moving(routes.timeline), open: unfold },
  { file: `${CASE}people/page.tsx`, who: "owner", path: moving(routes.people), open: async (page) => void (await page.getByRole("combobox", { name: "Part" }).selectOption({ index: 2 })) },
  { file: `${CASE}unit/page.tsx`, who: "owner", path: moving(routes.unit), open: unfold },
  { file: `${CASE}unit/page.tsx`, who: "inspector", path: moving(routes.unit), what: "to read" },
];

const NOWHERE: readonly PageRow[] = [
  { file: "app/not-found.tsx", who: null, path: () => "/nowhere", status: 404 },
  { file: "app/not-found.tsx", who: "receiver", path: ({ fresh: { moveId } }) => routes.move(moveId), what: "somebody else’s case", status: 404 },
  { file: "app/not-found.tsx", who: "receiver", path: ({ companyId }) => routes.company(companyId), what: "somebody else’s company", status: 404 },
  { file: "app/(front)/follow/[token]/not-found.tsx", who: null, path: () => routes.follow(NO_TOKEN), status: 404 },
];

/** Every page of the site; one that has no row here fails a test. */
export const PAGES: readonly PageRow[] = [...FRONT, ...DESK, ...OF_A_CASE, ...NOWHERE];

export const titleOf = ({ file, who, what }: PageRow) => `${file.replace(/^app\//, "").replace(/\/?page\.tsx$/, "") || "/"}${what ? `, ${what}` : ""}, as ${who ?? "nobody"}`;

/** Finds the cases of the demo, and makes what it lacks: a draft, an open letter, and a link to follow by. */
export async function findWorld(browser: Browser): Promise<World> {
  const [underWay, absent, closed, fresh] = await Promise.all(["2783", "18", "92", "4401"].map(demoCase));
  if (!underWay || !absent || !closed || !fresh) throw new Error("the demo is not whole");
  const page = await pageAs(browser, "owner");
  await page.goto(routes.moves());
  const email = `new.${Date.now()}@letters.example`;
  const { parties } = await readDoor<PeopleView>(page, routes.api.people(fresh.moveId));
  const companyId = parties.find(({ part }) => part === "contractor")?.companyId ?? "";
  await writeDoor(page, routes.api.invitations(fresh.moveId), { part: "contractor", legId: "", companyId, companyName: companyId ? "" : "Letterbox Mechanical", email, name: "", inspects: false, bills: false, dispatches: false });
  const { url } = await writeDoor<{ url: string }>(page, routes.api.followLinks(underWay.moveId), { label: "Friends of the line", email: "" });
  const { draftId } = await writeDoor<{ draftId: string }>(page, routes.api.drafts(), { companyId: await companyOf("owner"), body: { answers: { mark: "ZVRX", number: "77" } } });
  const joinPath = new URL(linkIn(await letterTo(email, /asks you to join/), "join")).pathname;
  await page.context().close();
  return { moving: underWay, absent, closed, fresh, companyId: await companyOf("clerk"), draftId, joinPath, followPath: new URL(url).pathname };
}
