import "server-only";
import { and, eq } from "drizzle-orm";
import { outbox } from "@/db/schema";
import { AppError } from "@/lib/errors";
import { appendSiteLog } from "@/lib/record/commands";
import { write } from "@/lib/standing/commands";
import type { Attempt, Viewer } from "@/lib/viewer/types";
import type { RetryMail } from "../input";
import { requireSiteAdmin } from "../queries";

/** Puts a message that was given up back into the outbox, to be tried at once. It keeps its Message-ID, so a mail server knows a repeat. */
export async function retryMail(viewer: Viewer, { outboxId }: RetryMail, attempt: Attempt) {
  requireSiteAdmin(viewer);
  return write(viewer, attempt, async (tx) => {
    const [row] = await tx.select({ state: outbox.state, kind: outbox.kind }).from(outbox).where(eq(outbox.id, outboxId)).for("update");
    if (!row) throw new AppError("not_found", "No such message.");
    if (row.state !== "failed") throw new AppError("not_yet", "Only a message that was given up can be tried again.");
    await tx.update(outbox).set({ state: "ready", attempts: 0, runAt: attempt.at, leaseUntil: null }).where(and(eq(outbox.id, outboxId), eq(outbox.state, "failed")));
    await appendSiteLog(tx, { kind: "mail.retried", byUserId: viewer.userId, detail: { outboxId, kind: row.kind } }, attempt.at);
    return { outboxId };
  });
}
