/** Ids of things that are there, by the name that a path or a body gives them. */
export type DoorIds = Readonly<Record<"moveId" | "legId" | "itemId" | "inspectionId" | "findingId" | "acceptanceId" | "quoteId" | "instructionId" | "sightingId" | "photoId" | "seatId" | "invitationId" | "followId" | "draftId" | "companyId" | "userId" | "sessionId" | "outboxId", string>>;

/** `signed-in`: a session of ours; a write also comes from our own origin, as JSON, under a key. `signature`: the caller’s signature over the bytes. `upload`: a session or the file service’s signature. */
export type Door = {
  door: string;
  who: "signed-in" | "signature" | "upload";
  /** Whose it is: somebody without a part in it is told what they are told of an id of nothing. `mine`: the caller’s own, whoever calls. */
  of: "case" | "company" | "draft" | "administration" | "mine";
  /** A body that the door takes, for writes. */
  body?: (ids: DoorIds) => Record<string, unknown>;
};

const NOTHING = () => ({});
const HASH = "0".repeat(64);
const zone = "America/Chicago";
const origin = { name: "Sand Hollow elevator", place: "Sand Hollow", zone };
const answers = { mark: "ZVRX", number: "2784", "f-end": "short-hood", shape: "hood", axles: "6" };
const carrier = { carrierName: "Quillan & Sandbar", payer: "unnamed" };
const opening = { answers, aliases: [], origin, destination: origin, legs: [{ ...carrier, toPlace: "Ardell", toZone: zone }] };
const works = { inspects: true, bills: false, dispatches: false };

const open = (of: Door["of"], door: string, body?: Door["body"]): Door => ({ door, who: "signed-in", of, ...(body && { body }) });

const M = "/api/v1/moves/[moveId]";
const C = "/api/v1/companies";

const CASE: Door[] = [
  open("case", `GET ${M}`),
  open("case", `PUT ${M}`, () => ({ version: 1, origin, destination: origin })),
  open("case", `POST ${M}/cancel`, () => ({ reason: "Sold" })),
  open("case", `POST ${M}/close`, () => ({ name: "R. Okafor" })),
  open("case", `GET ${M}/equipment`),
  open("case", `PUT ${M}/equipment`, () => ({ version: 1, answers, aliases: [] })),
  open("case", `PUT ${M}/legs/[legId]`, () => ({ version: 1, ...carrier })),
  open("case", `GET ${M}/people`),
  open("case", `DELETE ${M}/people/[seatId]`, NOTHING),
  open("case", `POST ${M}/invitations`, () => ({ part: "receiver", companyName: "Tallow Museum", email: "museum@example.test" })),
  open("case", `DELETE ${M}/invitations/[invitationId]`, NOTHING),
  open("case", `POST ${M}/invitations/[invitationId]/again`, NOTHING),
  open("case", `POST ${M}/follow-links`, () => ({ label: "Friends of the museum" })),
  open("case", `DELETE ${M}/follow-links/[followId]`, NOTHING),
  open("case", `GET ${M}/photos`),
  open("case", `POST ${M}/photos`, () => ({ clientId: crypto.randomUUID(), name: "front.jpg", type: "image/jpeg", sizeBytes: 1000, sha256: HASH, widthPx: 800, heightPx: 600 })),
  open("case", `GET ${M}/photos/[photoId]`),
  open("case", `GET ${M}/photos/[photoId]/original`),
  open("case", `GET ${M}/photos/[photoId]/preview`),
  open("case", `GET ${M}/prep`),
  open("case", `POST ${M}/prep/sign`, () => ({ phase: "where-it-stands", name: "T. Ibarra", rowsHash: HASH })),
  open("case", `POST ${M}/prep/[itemId]/done`, () => ({ version: 1 })),
  open("case", `POST ${M}/prep/[itemId]/skip`, () => ({ version: 1, why: "None is fitted" })),
  open("case", `POST ${M}/prep/[itemId]/reopen`, () => ({ version: 1, why: "The cap blew off" })),
  open("case", `POST ${M}/restore/[itemId]/restored`, () => ({ version: 1 })),
  open("case", `POST ${M}/restore/[itemId]/kept`, () => ({ version: 1, why: "It goes on display" })),
  open("case", `POST ${M}/restore/[itemId]/reopen`, () => ({ version: 1, why: "Wrong item" })),
  open("case", `GET ${M}/inspections`),
  open("case", `POST ${M}/inspections`, ({ legId }) => ({ legId, visitedOn: "2026-01-05", place: "Sand Hollow", zone, inspectorName: "V. Sorrel", air: "off" })),
  open("case", `GET ${M}/findings`),
  open("case", `POST ${M}/findings`, ({ inspectionId }) => ({ inspectionId, componentId: "flat-spot", placeId: "wheel-R4", observed: "Flat along the tread.", severity: "note", photoIds: [], noPhotoReason: "The light was gone." })),
  open("case", `GET ${M}/findings/[findingId]`),
  open("case", `POST ${M}/findings/[findingId]/answer`, () => ({ version: 1, text: "Turned.", photoIds: [] })),
  open("case", `POST ${M}/findings/[findingId]/clear`, () => ({ version: 1 })),
  open("case", `POST ${M}/findings/[findingId]/not-cleared`, () => ({ version: 1, text: "Still flat.", wouldSatisfy: "Turn it again.", photoIds: [] })),
  open("case", `POST ${M}/findings/[findingId]/withdraw`, () => ({ version: 1, text: "It was another unit." })),
  open("case", `GET ${M}/acceptances`),
  open("case", `POST ${M}/acceptances`, ({ legId }) => ({ legId, restrictions: ["mph-25"], name: "V. Sorrel", rowsHash: HASH })),
  open("case", `POST ${M}/acceptances/[acceptanceId]/withdraw`, () => ({ why: "Signed for another unit" })),
  open("case", `GET ${M}/fees`),
  open("case", `POST ${M}/quotes`, ({ legId }) => ({ legId, lines: [{ kind: "line-haul", description: "To Ardell", amount: "4,185.00" }] })),
  open("case", `POST ${M}/quotes/[quoteId]/agree`, NOTHING),
  open("case", `POST ${M}/quotes/[quoteId]/pay`, NOTHING),
  open("case", `POST ${M}/quotes/[quoteId]/void`, () => ({ why: "Wrong route" })),
  open("case", `POST ${M}/billing-clearances`, ({ legId }) => ({ legId, note: "Credit account" })),
  open("case", `GET ${M}/movement`),
  open("case", `POST ${M}/instructions`, ({ legId }) => ({ legId, billNumber: "B-4410" })),
  open("case", `POST ${M}/instructions/[instructionId]/withdraw`, () => ({ why: "The train was annulled" })),
  open("case", `POST ${M}/release`, () => ({ name: "R. Okafor" })),
  open("case", `POST ${M}/sightings`, ({ legId }) => ({ legId, kind: "seen", place: "Ardell", zone, occurredAt: "2026-01-05T08:30" })),
  open("case", `POST ${M}/sightings/[sightingId]/retract`, () => ({ why: "Another unit" })),
  open("case", `POST ${M}/arrival`, ({ photoId }) => ({ arrivedOn: "2026-01-05", condition: "As it left.", name: "M. Alder", photoIds: [photoId] })),
  open("case", `GET ${M}/timeline`),
];

const COMPANY: Door[] = [
  open("mine", `GET ${C}`),
  open("mine", `POST ${C}`, () => ({ name: "New Works", mark: "", phone: "" })),
  open("company", `GET ${C}/[companyId]`),
  open("company", `PUT ${C}/[companyId]`, () => ({ version: 1, name: "Other Works", mark: "", phone: "" })),
  open("company", `POST ${C}/[companyId]/members/[userId]`, () => works),
  open("company", `PUT ${C}/[companyId]/members/[userId]`, () => ({ manager: true, ...works })),
  open("company", `DELETE ${C}/[companyId]/members/[userId]`, NOTHING),
  open("company", `POST ${C}/[companyId]/invitations`, () => ({ email: "colleague@example.test", ...works })),
  open("company", `DELETE ${C}/[companyId]/invitations/[invitationId]`, NOTHING),
  open("company", `POST ${C}/[companyId]/invitations/[invitationId]/again`, NOTHING),
];

const ADMIN: Door[] = [
  open("administration", "GET /api/v1/admin/companies"),
  open("administration", "POST /api/v1/admin/companies/merge", ({ companyId }) => ({ keepId: companyId, goneId: companyId.replace(/.$/, (last) => (last === "0" ? "1" : "0")) })),
  open("administration", "GET /api/v1/admin/mail"),
  open("administration", "POST /api/v1/admin/mail/[outboxId]/retry", NOTHING),
  open("administration", "GET /api/v1/admin/people"),
  open("administration", "POST /api/v1/admin/people/[userId]/disable", NOTHING),
  open("administration", "POST /api/v1/admin/people/[userId]/enable", NOTHING),
  open("administration", "POST /api/v1/admin/people/[userId]/end-sessions", NOTHING),
];

/** Every door and who may knock at it; what is behind is in the rows of the rooms. */
export const DOORS: readonly Door[] = [
  { door: "POST /api/stripe/webhook", who: "signature", of: "case" },
  { door: "POST /api/uploadthing", who: "upload", of: "mine" },
  open("mine", "GET /api/v1/account"),
  open("mine", "PUT /api/v1/account", () => ({ name: "N. New" })),
  open("mine", "POST /api/v1/account/password", () => ({ currentPassword: "not the one that stands", newPassword: "quarry lantern seven ferns" })),
  open("mine", "DELETE /api/v1/account/sessions", NOTHING),
  open("company", "DELETE /api/v1/account/sessions/[sessionId]", NOTHING),
  open("mine", "GET /api/v1/moves"),
  open("mine", "POST /api/v1/moves", ({ companyId }) => ({ companyId, ...opening })),
  open("mine", "GET /api/v1/drafts"),
  open("company", "POST /api/v1/drafts", ({ companyId }) => ({ companyId, body: {} })),
  open("draft", "GET /api/v1/drafts/[draftId]"),
  open("draft", "PUT /api/v1/drafts/[draftId]", ({ companyId }) => ({ companyId, body: {}, version: 1 })),
  open("draft", "DELETE /api/v1/drafts/[draftId]", NOTHING),
  open("mine", "POST /api/v1/drafts/[draftId]/open", ({ companyId }) => ({ companyId, ...opening })),
  ...CASE,
  ...COMPANY,
  ...ADMIN,
];
