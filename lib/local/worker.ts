import { closeDb } from "@/db/client";
import { readEnv } from "@/lib/env";
import { unsafeSweepPhotos } from "@/lib/evidence/commands/arrivals";
import { unsafeCheckPhoto } from "@/lib/evidence/commands/check";
import { unsafeCheckOpenPayments, unsafeCheckPayment } from "@/lib/fees/commands/checks";
import { unsafeRefreshLapsed } from "@/lib/standing/commands";
import { runWorker, type WorkerParts } from "@/lib/worker/run";
import { readEnvFile } from "./environment";

/** What the worker does besides mail: looks at originals that arrived, and asks after what never came back by itself. */
const PARTS: WorkerParts = {
  tasks: {
    "check-photo": ({ photoId }, now) => unsafeCheckPhoto(photoId, now),
    "check-payment": ({ paymentId }, now) => unsafeCheckPayment(paymentId, now),
  },
  rounds: [
    { name: "photos without a callback", everySeconds: 60, run: unsafeSweepPhotos },
    { name: "acceptances that ran out", everySeconds: 900, run: unsafeRefreshLapsed },
    { name: "open payments", everySeconds: 120, run: async (now) => void (await unsafeCheckOpenPayments(now)) },
  ],
};

async function main(): Promise<void> {
  readEnvFile(process.cwd());
  const read = readEnv(process.env);
  if (read.env === null) {
    process.stderr.write(`The environment is not usable:\n${read.faults.map((fault) => `  ${fault}\n`).join("")}`);
    process.exitCode = 1;
    return;
  }
  const stop = new AbortController();
  for (const signal of ["SIGTERM", "SIGINT"] as const) process.once(signal, () => stop.abort());
  await runWorker(PARTS, stop.signal);
  await closeDb();
}

void main();
