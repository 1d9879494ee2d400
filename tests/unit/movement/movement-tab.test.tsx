import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { render, screen, waitFor, within } from "@testing-library/react";
import userEvent from "@testing-library/user-event";
import { afterEach, beforeAll, beforeEach, expect, it, vi } from "vitest";
import { loadForms } from "@/components/movement/forms";
import { MovementTab } from "@/components/movement/movement-tab";
import { movementOptions } from "@/lib/movement/options";
import type { Movement, MovementLeg, SightingView } from "@/lib/movement/types";

const MOVE = "mov_1";
const AT = "2026-11-24T20:00:00.000Z";

const aLeg = (seq: number, given: Partial<MovementLeg> = {}): MovementLeg => ({
  legId: `leg-${seq}`, seq, carrierName: seq === 1 ? "Quillan & Sandbar" : "Sable Mountain Lines", fromPlace: "Sand Hollow", fromZone: "America/Chicago", toPlace: "Ardell", toZone: "America/Denver", onBoard: true,
  conditions: [{ id: "prep", label: "Prep signed, where it stands", met: true, detail: "34 of 34 items" }, { id: "instruction", label: "Movement instruction", met: true, detail: "Given by the transport desk" }, { id: "release", label: "Released by the owner", met: false, detail: "Not released" }],
  instruction: null, release: null, takenOver: false, delivered: false, restrictions: [], validUntil: null, kinds: [], may: { instruct: false, sight: false, release: false, enterFor: false, asReceiver: false }, ...given,
});

const aSeen = (given: Partial<SightingView> = {}): SightingView => ({
  id: "sgt-1", legId: "leg-1", kind: "delivered", place: "Ardell", zone: "America/Denver", occurredAt: "2026-11-22T18:00:00.000Z", train: null, note: null, byName: "D. Sand", enteredFor: null, at: "2026-11-22T18:05:00.000Z", retracted: null, corrects: null, photos: [], mayRetract: false, ...given,
});

const aMovement = (given: Partial<Movement> = {}): Movement => ({
  unit: "ZVRX 2783", legs: [aLeg(1), aLeg(2)], sightings: [], arrival: null, arrived: false, destination: { name: "Vellum Ridge shops", place: "Quill Creek", zone: "America/Denver" }, placed: false,
  restore: { total: 3, left: 3 }, closing: { may: false, missing: ["The receiver’s look at arrival: not recorded"], closedAt: null }, may: { arrive: false }, at: AT, ...given,
});

type Sent = { path: string; body: Record<string, unknown>; key: string | null };
let sent: Sent[] = [];
let answers: Response[] = [];
let shown: Movement | null = null;

beforeAll(loadForms);

beforeEach(() => {
  sent = [];
  answers = [];
  vi.stubGlobal("fetch", (path: string, init: RequestInit = {}) => {
    if (init.method !== "POST") return Promise.resolve(Response.json(shown));
    sent.push({ path, body: JSON.parse(String(init.body)) as Record<string, unknown>, key: new Headers(init.headers).get("idempotency-key") });
    return Promise.resolve(answers.shift() ?? Response.json({}));
  });
});
afterEach(() => vi.unstubAllGlobals());

function show(movement: Movement) {
  shown = movement;
  const client = new QueryClient({ defaultOptions: { queries: { staleTime: Infinity, refetchInterval: false } } });
  client.setQueryData(movementOptions(MOVE).queryKey, movement);
  render(<QueryClientProvider client={client}><MovementTab moveId={MOVE} /></QueryClientProvider>);
}

it("says how long a unit stands handed over and not received", () => {
  show(aMovement({ legs: [aLeg(1, { takenOver: true, delivered: true }), aLeg(2)], sightings: [aSeen()] }));
  expect(screen.getByText("Handed over at Ardell, not received by Sable Mountain Lines: 2 days.")).toBeDefined();
  expect(screen.getByText("CLM J, X12 304 ICH")).toBeDefined();
});

it("shows what was taken back struck through, with its reason, and what was entered for a carrier as that", () => {
  const enteredFor = { carrierName: "Quillan & Sandbar", source: "phone", heardOn: "2026-11-22", saidBy: "V. Sorrel", reference: null } as const;
  show(aMovement({ sightings: [aSeen({ enteredFor, byName: "R. Okafor", retracted: { at: AT, why: "Another unit" } })] }));
  expect(screen.getByText("Handed over").closest("s")).not.toBeNull();
  expect(screen.getByText("Taken back 24 Nov 13:00 MST: Another unit")).toBeDefined();
  expect(screen.getByText(/Entered by R. Okafor from a phone call, 22 Nov 2026; said by V. Sorrel of Quillan & Sandbar/)).toBeDefined();
});

it("the release shows what is signed, what still happens, and the caution; a refusal keeps what was typed and the same key goes again", async () => {
  show(aMovement({ legs: [aLeg(1, { may: { instruct: false, sight: false, release: true, enterFor: false, asReceiver: false } })] }));
  await userEvent.click(screen.getByRole("button", { name: "Release the unit…" }));
  const dialog = within(screen.getByRole("dialog", { name: "Release the unit" }));
  expect(dialog.getByText("The owner tenders ZVRX 2783 to Quillan & Sandbar for movement dead in tow, under its acceptance and movement instruction.")).toBeDefined();
  expect(dialog.getByText(/The hand brake stays applied and the wheels stay chocked/)).toBeDefined();
  await userEvent.type(dialog.getByLabelText(/^Your name/), "R. Okafor");
  answers = [Response.json({ title: "The unit can’t be released yet.", missing: ["Movement instruction: not given"] }, { status: 409 })];
  await userEvent.click(dialog.getByRole("button", { name: "Sign and release" }));
  expect(await dialog.findByText("Movement instruction: not given")).toBeDefined();
  expect(dialog.getByLabelText<HTMLInputElement>(/^Your name/).value).toBe("R. Okafor");
  await userEvent.click(dialog.getByRole("button", { name: "Sign and release" }));
  await waitFor(() => expect(screen.queryByRole("button", { name: "Sign and release" })).toBeNull());
  expect(sent.map((one) => one.body)).toEqual([{ name: "R. Okafor", note: "" }, { name: "R. Okafor", note: "" }]);
  expect(sent[0]?.key).toBe(sent[1]?.key);
});

it("a release is not offered before its conditions stand; what is missing is said", () => {
  const leg = aLeg(1, { may: { instruct: false, sight: false, release: true, enterFor: false, asReceiver: false }, conditions: [{ id: "acceptance", label: "Acceptance", met: false, detail: "Not inspected yet" }] });
  show(aMovement({ legs: [leg] }));
  expect(screen.queryByRole("button", { name: "Release the unit…" })).toBeNull();
  expect(screen.getByText("It can be released when these stand: acceptance.")).toBeDefined();
});

it("a sighting fills in where and when it usually is, and sends what was typed", async () => {
  show(aMovement({ legs: [aLeg(1, { kinds: ["pulled"], may: { instruct: false, sight: true, release: false, enterFor: false, asReceiver: false } })] }));
  await userEvent.click(screen.getByRole("button", { name: "Record that it was pulled" }));
  expect(document.activeElement?.tagName).toBe("FORM");
  expect(screen.getByLabelText<HTMLInputElement>(/^Where/).value).toBe("Sand Hollow");
  expect(screen.getByLabelText<HTMLInputElement>(/^When, by the clock there/).value).toMatch(/^\d{4}-\d\d-\d\dT\d\d:\d\d$/);
  expect(screen.getByText(/Until it is coupled the hand brake stays applied/)).toBeDefined();
  await userEvent.click(screen.getByRole("button", { name: "Record it" }));
  await waitFor(() => expect(sent).toHaveLength(1));
  expect(sent[0]?.body).toMatchObject({ legId: "leg-1", kind: "pulled", place: "Sand Hollow", zone: "America/Chicago", photoIds: [], corrects: null, enteredFor: null });
  await waitFor(() => expect(document.activeElement?.id).toBe("leg-leg-1"));
  expect(screen.queryByLabelText(/^What happened/)).toBeNull();
});

it("an absent carrier's sighting asks how it was heard; the receiver's own does not", async () => {
  show(aMovement({ legs: [aLeg(1, { takenOver: true, onBoard: false, kinds: ["departed", "placed"], may: { instruct: false, sight: true, release: false, enterFor: true, asReceiver: true } })] }));
  await userEvent.click(screen.getByRole("button", { name: "Record a sighting" }));
  expect(screen.getByRole("radiogroup", { name: /How it came/ })).toBeDefined();
  await userEvent.click(screen.getByLabelText("I saw it, as the receiver"));
  expect(screen.queryByRole("radiogroup", { name: /How it came/ })).toBeNull();
  expect(within(screen.getByLabelText(/^What happened/)).getAllByRole("option").map((one) => one.textContent)).toEqual(["choose", "Placed, CLM Z, X12 304 PAC"]);
});

it("the receiver looks the unit over; closing says what it waits for", async () => {
  show(aMovement({ legs: [aLeg(1, { takenOver: true })], placed: true, may: { arrive: true } }));
  expect(screen.getByText("The receiver’s look at arrival: not recorded")).toBeDefined();
  await userEvent.click(screen.getByRole("button", { name: "Record the arrival" }));
  expect(screen.getByText("ZVRX 2783 was looked over at Vellum Ridge shops against the photos taken before departure; what was found is written above.")).toBeDefined();
  expect(screen.getByRole("link", { name: "photos from before departure" })).toBeDefined();
  answers = [Response.json({ title: "Some entries need another look.", fields: { photoIds: ["Add at least one photo: the same views as at departure."] } }, { status: 422 })];
  await userEvent.click(screen.getByRole("button", { name: "Sign the arrival" }));
  expect((await screen.findAllByText("Add at least one photo: the same views as at departure.")).length).toBe(2);
});
