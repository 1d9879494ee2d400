import { eq } from "drizzle-orm";
import { db } from "@/db/client";
import { outbox, users } from "@/db/schema";
import { inviteParty } from "@/lib/parties/commands/invite";
import { unsafeJoin } from "@/lib/parties/commands/join";
import { invitePartyInput } from "@/lib/parties/input";
import { unseal } from "@/lib/outbox/seal";
import { unsafeViewerOf } from "@/lib/viewer/queries";
import type { Viewer } from "@/lib/viewer/types";
import { anAttempt } from "../../support/factories";

export const anAddress = () => `person.${crypto.randomUUID().slice(0, 8)}@example.test`;

/** The token in the newest letter of invitation to an address. */
export async function letterTo(email: string): Promise<string> {
  const rows = await db().select().from(outbox).where(eq(outbox.toAddress, email)).orderBy(outbox.id);
  const last = rows.filter((row) => row.kind === "invitation").at(-1);
  return (JSON.parse(unseal(last?.payload ?? "")) as { url: string }).url.split("/").at(-1) ?? "";
}

export const invite = (owner: Viewer, moveId: string, given: Record<string, unknown>) => inviteParty(owner, invitePartyInput.parse({ moveId, ...given }), anAttempt());

/** Presses the button of a letter. */
export const join = (token: string, given: { once?: string; name?: string | null; viewer?: Viewer | null; now?: Date } = {}) =>
  unsafeJoin({ token, once: given.once ?? crypto.randomUUID(), name: given.name ?? null }, { address: crypto.randomUUID(), headers: new Headers() }, given.viewer ?? null, given.now);

export async function viewerAt(email: string): Promise<Viewer> {
  const [row] = await db().select({ id: users.id }).from(users).where(eq(users.email, email));
  const viewer = row ? await unsafeViewerOf(row.id, null) : null;
  if (!viewer) throw new Error(`nobody at ${email}`);
  return viewer;
}
