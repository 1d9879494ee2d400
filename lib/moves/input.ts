import { z } from "zod";
import { dayOrNull, idOf, line, lineOrNull, lines, linesOrNull, zoneOf } from "@/lib/access/input";
import { findRequirement } from "./catalogue";
import type { Requirement } from "./requirements/types";

const REQUIRED: Readonly<Record<string, string>> = {
  mark: "Enter the reporting mark as it is stencilled.",
  number: "Enter the number as it is stencilled.",
  shape: "Choose the kind of body.",
  "f-end": "Choose which end is stencilled F.",
  axles: "Choose the number of axles.",
};
const MAX: Readonly<Record<string, number>> = { mark: 12, number: 12, model: 200 };
const MAX_TEXT = 300;

/** Bounds of the figures that are computed with; the rest of the numbers only have to be numbers. */
const WHOLE: Readonly<Record<string, { from: number; to: number; words: string }>> = {
  weight: { from: 10_000, to: 2_000_000, words: "Enter the weight in whole pounds, between 10,000 and 2,000,000." },
  built: { from: 1850, to: 2100, words: "Enter a year between 1850 and 2100." },
};

const number = (typed: string) => Number(typed.replaceAll(",", ""));

function faultOf({ key, kind, choices }: Requirement, typed: string): string | null {
  if (typed === "") return REQUIRED[key] ?? null;
  const bounds = WHOLE[key];
  if (bounds) return Number.isInteger(number(typed)) && number(typed) >= bounds.from && number(typed) <= bounds.to ? null : bounds.words;
  if (kind === "number") return Number.isFinite(number(typed)) && number(typed) >= 0 ? null : "Enter a number.";
  if (kind === "choice") return choices?.some((choice) => choice.value === typed) ? null : "Choose one of the list.";
  if (kind === "date") return z.iso.date().safeParse(typed).success ? null : "Enter a day that exists.";
  const checked = line("", MAX[key] ?? MAX_TEXT).safeParse(typed);
  return checked.success ? null : (checked.error.issues[0]?.message ?? "Enter it in another way.");
}

/** Answers to the requirement catalogue, by key; each fault under its own key. Figures lose the commas between thousands. */
export const answersInput = z.record(z.string().max(60), z.string({ error: "Enter text." })).transform((given, ctx) => {
  const answers: Record<string, string> = {};
  for (const [key, value] of Object.entries({ ...Object.fromEntries(Object.keys(REQUIRED).map((needed) => [needed, ""])), ...given })) {
    const typed = value.normalize("NFC").trim();
    const requirement = findRequirement(key);
    const fault = requirement ? faultOf(requirement, typed) : "Not a question of the list.";
    if (fault) ctx.addIssue({ code: "custom", path: [key], message: fault });
    answers[key] = requirement?.kind === "number" ? typed.replaceAll(",", "") : typed;
  }
  return answers;
});

const aliasesInput = z.array(line("Enter a mark and number.", 40)).max(12, "At most 12 other names.").transform((given) => [...new Set(given)]);

const placeInput = (what: string) =>
  z.strictObject({
    name: line(`Say what it is called: the shop, yard or siding ${what}.`),
    place: line("Enter the town or station."),
    zone: zoneOf,
  });

const MILES = "Enter whole miles.";
const milesOrNull = z.union([z.null(), z.literal("").transform(() => null), z.string().regex(/^\d{1,4}$/, MILES).transform(Number), z.number({ error: MILES }).int(MILES).min(0, MILES).max(9999, MILES)], { error: MILES })
  .optional().transform((given) => given ?? null);

const carrier = {
  carrierName: line("Enter the carrier’s name."),
  carrierMark: z.union([z.null(), z.literal("").transform(() => null), z.string().trim().toUpperCase().regex(/^[A-Z&]{1,4}$/, "Letters only, four at most.")], { error: "Letters only, four at most." }).optional().transform((given) => given ?? null),
  miles: milesOrNull,
};

/** Who pays a carrier: a company of ours, another by name, or nobody yet. */
const withPayer = <Shape extends z.core.$ZodLooseShape>(shape: Shape) =>
  z.discriminatedUnion("payer", [
    z.strictObject({ ...shape, payer: z.literal("other"), payerName: line("Enter the name of the company that pays.") }),
    z.strictObject({ ...shape, payer: z.literal("ours"), payerName: lineOrNull() }),
    z.strictObject({ ...shape, payer: z.literal("unnamed"), payerName: lineOrNull() }),
  ], { error: "Choose who pays." });

const legInput = withPayer({ ...carrier, toPlace: line("Enter where the next carrier takes over."), toZone: zoneOf });

const when = { wantedFrom: dayOrNull, wantedTo: dayOrNull };
const inOrder = ({ wantedFrom, wantedTo }: { wantedFrom?: unknown; wantedTo?: unknown }) => typeof wantedFrom !== "string" || typeof wantedTo !== "string" || wantedTo === "" || wantedFrom <= wantedTo;
/** Checked even when other fields are wrong, so that every fault is told at once. */
const ORDER = { path: ["wantedTo"], error: "The last day lies before the first.", when: ({ value }: { value: unknown }) => typeof value === "object" && value !== null };

const OWNER = "Choose the company that owns the unit.";

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === "object" && value !== null && !Array.isArray(value);

/** Where the last leg ends is the destination’s matter: its own fields get something that passes, and nothing reads it. */
function passLastLeg(given: unknown): unknown {
  if (!isObject(given) || !Array.isArray(given.legs)) return given;
  const last = given.legs.length - 1;
  return { ...given, legs: given.legs.map((leg: unknown, at) => (at === last && isObject(leg) ? { ...leg, toPlace: "-", toZone: "America/Chicago" } : leg)) };
}

/** A move to be opened; `draftId` names the draft that it ends. */
export const openMoveInput = z.preprocess(
  passLastLeg,
  z.strictObject({
    draftId: idOf.nullish().transform((given) => given ?? null),
    companyId: z.string({ error: OWNER }).regex(/^com_[0-9a-f]{28}$/, OWNER),
    answers: answersInput,
    aliases: aliasesInput,
    origin: placeInput("where it stands"),
    destination: placeInput("that it goes to"),
    legs: z.array(legInput, { error: "Enter at least one leg." }).min(1, "Enter at least one leg.").max(12, "At most 12 legs."),
    ...when,
    note: linesOrNull(2000),
  }).refine(inOrder, ORDER),
);
export type OpenMove = z.output<typeof openMoveInput>;

const version = z.number({ error: "Say which version was changed." }).int().min(1);
const body = z.record(z.string().max(60), z.unknown());

/** A draft is kept as typed; nothing in it is checked before the move is opened. */
export const beginDraftInput = z.strictObject({ companyId: idOf, body });
export type BeginDraft = z.output<typeof beginDraftInput>;
export const saveDraftInput = z.strictObject({ draftId: idOf, companyId: idOf, body, version });
export type SaveDraft = z.output<typeof saveDraftInput>;
export const discardDraftInput = z.strictObject({ draftId: idOf });
export type DiscardDraft = z.output<typeof discardDraftInput>;

export const editEquipmentInput = z.strictObject({ moveId: idOf, version, answers: answersInput, aliases: aliasesInput });
export type EditEquipment = z.output<typeof editEquipmentInput>;

/** One leg; where the last one ends is the destination's matter, so its place may be left out. */
export const editLegInput = withPayer({ moveId: idOf, legId: idOf, version, ...carrier, toPlace: lineOrNull(), toZone: z.union([z.null(), z.literal("").transform(() => null), zoneOf]).optional().transform((given) => given ?? null) });
export type EditLeg = z.output<typeof editLegInput>;

export const editMoveInput = z.strictObject({ moveId: idOf, version, origin: placeInput("where it stands"), destination: placeInput("that it goes to"), ...when, note: linesOrNull(2000) }).refine(inOrder, ORDER);
export type EditMove = z.output<typeof editMoveInput>;

export const cancelMoveInput = z.strictObject({ moveId: idOf, reason: lines("Say why, so that everybody on the case knows.", 1000) });
export type CancelMove = z.output<typeof cancelMoveInput>;
