import "server-only";
import { createHmac } from "node:crypto";
import { and, eq } from "drizzle-orm";
import { equipment, followLinks } from "@/db/schema";
import { env } from "@/lib/env";
import { AppError } from "@/lib/errors";
import { newId, sha256Hex } from "@/lib/ids";
import { putMail } from "@/lib/outbox/commands";
import { routes } from "@/lib/routes";
import { writeOnMove } from "@/lib/standing/commands";
import { unsafeCountTry } from "@/lib/viewer/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { EndFollowLink, MakeFollowLink } from "../input";
import { FOLLOW_DAYS } from "../vocabulary";

/** The secret of a link, from the key of the attempt: a repeat gets the same link again, though only its hash and no answer with it is stored. 192 bits. */
const tokenOf = (viewer: Viewer, attempt: Attempt) => createHmac("sha256", env().AUTH_SECRET).update(`follow link\n${viewer.userId}\n${attempt.key}`).digest().subarray(0, 24).toString("base64url");

/** Makes a link by which a notify party follows the move without an account. It is shown this once, and mailed where an address is given. */
export async function makeFollowLink(viewer: Viewer, input: MakeFollowLink, attempt: Attempt) {
  await unsafeCountTry("invite-account", viewer.userId, attempt.at);
  const token = tokenOf(viewer, attempt);
  const url = `${env().APP_URL}${routes.follow(token)}`;
  const { followId } = await writeOnMove(viewer, attempt, input.moveId, async (ctx) => {
    ctx.allow({ action: "follow.make" });
    const id = newId("follow");
    const expiresAt = new Date(ctx.at.getTime() + FOLLOW_DAYS * 24 * 3600 * 1000);
    await ctx.tx.insert(followLinks).values({ id, moveId: input.moveId, label: input.label, email: input.email, tokenHash: sha256Hex(token), createdBy: viewer.userId, createdAt: ctx.at, expiresAt });
    if (input.email) {
      const [unit] = await ctx.tx.select({ mark: equipment.mark, number: equipment.number }).from(equipment).where(eq(equipment.moveId, input.moveId));
      const payload = { unit: `${unit?.mark ?? ""} ${unit?.number ?? ""}`.trim(), from: ctx.move.originPlace, to: ctx.move.destinationPlace, url };
      await putMail(ctx.tx, { kind: "follow-link", to: input.email, moveId: input.moveId, payload, dedupe: `follow-link:${id}` }, ctx.at);
    }
    await ctx.append({ kind: "follow.made", detail: { label: input.label } });
    return { followId: id };
  });
  return { followId, url };
}

/** Ends a link at once. */
export async function endFollowLink(viewer: Viewer, { moveId, followId }: EndFollowLink, attempt: Attempt) {
  return writeOnMove(viewer, attempt, moveId, async (ctx) => {
    ctx.allow({ action: "follow.make" });
    const own = and(eq(followLinks.id, followId), eq(followLinks.moveId, moveId));
    const [link] = await ctx.tx.select({ label: followLinks.label, revokedAt: followLinks.revokedAt }).from(followLinks).where(own);
    if (!link) throw new AppError("not_found", "No such link on this move.");
    if (link.revokedAt) return { followId };
    await ctx.tx.update(followLinks).set({ revokedAt: ctx.at }).where(own);
    await ctx.append({ kind: "follow.ended", detail: { label: link.label } });
    return { followId };
  });
}
