import "server-only";
import { eq } from "drizzle-orm";
import type { Tx } from "@/db/client";
import { companies, equipment, legs, moves } from "@/db/schema";
import type { SeatPart } from "@/lib/access/vocabulary";
import { env } from "@/lib/env";
import { newToken, sha256Hex } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import { routes } from "@/lib/routes";
import type { Viewer } from "@/lib/viewer/types";
import type { Works } from "../types";
import { INVITATION_DAYS } from "../vocabulary";
import { partWords } from "../words";

const DAY_MS = 24 * 3600 * 1000;

/** A fresh token and how long it is good for; only its hash is stored. */
function freshToken(at: Date) {
  const token = newToken();
  return { token, tokenHash: sha256Hex(token), expiresAt: new Date(at.getTime() + INVITATION_DAYS * DAY_MS) };
}

type Posted = { invitationId: string; moveId: string | null; part: SeatPart | null; legId: string | null; companyId: string; email: string } & Works;

/** Makes the secret of a letter and puts the letter into the outbox; gives what to store of it. Takes the transaction that writes the invitation. */
export async function postLetter(tx: Tx, viewer: Viewer, letter: Posted, at: Date) {
  const { token, tokenHash, expiresAt } = freshToken(at);
  const [company] = await tx.select({ name: companies.name }).from(companies).where(eq(companies.id, letter.companyId));
  const companyName = company?.name ?? "";
  const [move] = letter.moveId
    ? await tx.select({ mark: equipment.mark, number: equipment.number, from: moves.originPlace, to: moves.destinationPlace, ownerName: companies.name })
      .from(moves).innerJoin(equipment, eq(equipment.moveId, moves.id)).innerJoin(companies, eq(companies.id, moves.ownerCompanyId)).where(eq(moves.id, letter.moveId))
    : [];
  const [leg] = letter.legId ? await tx.select({ seq: legs.seq, fromPlace: legs.fromPlace, toPlace: legs.toPlace }).from(legs).where(eq(legs.id, letter.legId)) : [];
  await putMail(tx, {
    kind: "invitation", to: letter.email, moveId: letter.moveId, dedupe: `invitation:${letter.invitationId}:${tokenHash}`,
    payload: {
      inviterName: viewer.name, inviterCompany: move?.ownerName ?? companyName, companyName, part: partWords(letter.part, leg ?? null, letter),
      unit: move ? `${move.mark} ${move.number}`.trim() : "", from: move?.from ?? "", to: move?.to ?? "",
      url: `${env().APP_URL}${routes.join(token)}`, goodUntil: expiresAt.toISOString().slice(0, 10),
    },
  }, at);
  return { tokenHash, expiresAt };
}
