/** How the payer of a leg is chosen. */
export const PAYER_CHOICES = ["unnamed", "ours", "other"] as const;
export type PayerChoice = (typeof PAYER_CHOICES)[number];

export type LegForm = { key: string; carrierName: string; carrierMark: string; toPlace: string; toZone: string; miles: string; payer: PayerChoice; payerName: string };

export type PlaceForm = { name: string; place: string; zone: string };

/** The form of a new move as typed, whether or not it makes sense yet. */
export type DraftForm = {
  companyId: string;
  answers: Record<string, string>;
  /** One in each line, or with commas between. */
  aliases: string;
  origin: PlaceForm;
  destination: PlaceForm;
  legs: LegForm[];
  wantedFrom: string;
  wantedTo: string;
  note: string;
};

export const emptyLeg = (key: string): LegForm => ({ key, carrierName: "", carrierMark: "", toPlace: "", toZone: "", miles: "", payer: "unnamed", payerName: "" });

const emptyPlace: PlaceForm = { name: "", place: "", zone: "" };

export const emptyDraft = (companyId: string): DraftForm => ({
  companyId, answers: {}, aliases: "", origin: emptyPlace, destination: emptyPlace, legs: [emptyLeg("1")], wantedFrom: "", wantedTo: "", note: "",
});

type Loose = Readonly<Record<string, unknown>>;

const recordOf = (value: unknown): Loose => (value !== null && typeof value === "object" && !Array.isArray(value) ? (value as Loose) : {});
const textOf = (value: unknown) => (typeof value === "string" ? value : "");
const textsOf = (value: unknown) => Object.fromEntries(Object.entries(recordOf(value)).filter((entry): entry is [string, string] => typeof entry[1] === "string"));

function legOf(value: unknown, at: number): LegForm {
  const leg = recordOf(value);
  return {
    key: textOf(leg.key) || String(at + 1),
    carrierName: textOf(leg.carrierName), carrierMark: textOf(leg.carrierMark), toPlace: textOf(leg.toPlace), toZone: textOf(leg.toZone), miles: textOf(leg.miles),
    payer: PAYER_CHOICES.find((choice) => choice === leg.payer) ?? "unnamed", payerName: textOf(leg.payerName),
  };
}

const placeOf = (value: unknown): PlaceForm => {
  const { name, place, zone } = recordOf(value);
  return { name: textOf(name), place: textOf(place), zone: textOf(zone) };
};

/** Reads a kept draft; whatever an older form left out or kept otherwise is empty, so that every draft opens. */
export function readForm(body: Loose, companyId: string): DraftForm {
  const legs = Array.isArray(body.legs) ? body.legs.map(legOf) : [];
  return {
    companyId,
    answers: textsOf(body.answers), aliases: textOf(body.aliases), origin: placeOf(body.origin), destination: placeOf(body.destination),
    legs: legs.length > 0 ? legs : [emptyLeg("1")],
    wantedFrom: textOf(body.wantedFrom), wantedTo: textOf(body.wantedTo), note: textOf(body.note),
  };
}

/** Aliases as typed, one by one. */
export const splitAliases = (typed: string) => [...new Set(typed.split(/[\n,;]/).map((alias) => alias.trim()).filter((alias) => alias !== ""))];

/** What is sent to open the move; every field's fault comes back under its path in here. */
export function toOpening({ legs, aliases, ...form }: DraftForm) {
  return { ...form, aliases: splitAliases(aliases), legs: legs.map(({ key: _key, ...leg }) => leg) };
}

/** The unit of a draft as a list shows it. */
export function draftUnit(body: Loose): string {
  const { mark = "", number = "" } = textsOf(body.answers);
  return `${mark} ${number}`.trim() || "Unit not named yet";
}

/** Where a draft goes from and to, as far as that is typed. */
export function draftRoute(body: Loose): string {
  const from = placeOf(body.origin);
  const to = placeOf(body.destination);
  return `${from.name || from.place || "origin open"} to ${to.name || to.place || "destination open"}`;
}

export type DraftDifference = { path: string; mine: string; theirs: string };

function flatten(value: unknown, path: string, into: Map<string, string>): Map<string, string> {
  if (typeof value === "string") into.set(path, value);
  else for (const [key, inner] of Object.entries(value ?? {})) if (key !== "key") flatten(inner, path ? `${path}.${key}` : key, into);
  return into;
}

/** Every field in which two versions of a draft differ. */
export function draftDifferences(mine: DraftForm, theirs: DraftForm): DraftDifference[] {
  const [a, b] = [flatten(mine, "", new Map()), flatten(theirs, "", new Map())];
  return [...new Set([...a.keys(), ...b.keys()])]
    .map((path) => ({ path, mine: a.get(path) ?? "", theirs: b.get(path) ?? "" }))
    .filter(({ mine: one, theirs: other }) => one !== other);
}
