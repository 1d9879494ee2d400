import { useSyncExternalStore } from "react";
import { announcePhoto } from "@/lib/evidence/options";
import { phoneStore } from "./phone-store";
import type { Prepared } from "./prepare";
import { UploadQueue, type Entry } from "./queue";
import { PhotoFault } from "./send-order";

/** Two tabs of one person must not send the same photo; a browser without locks leaves it to the server, which keeps one. */
async function alone(clientId: string, run: () => Promise<void>): Promise<boolean> {
  if (!navigator.locks) return run().then(() => true);
  return navigator.locks.request(`towfolio-photo-${clientId}`, { ifAvailable: true }, async (lock) => {
    if (lock) await run();
    return lock !== null;
  });
}

const preparer = () => import("./prepare");
const sender = () => import("./send-file");

/** Most pages send nothing, and the upload library is a third of our script: what opens and sends photos comes when one may be taken. What did not come is fetched again with the next try. */
export const loadSender = () => Promise.all([preparer(), sender()]);

const NOT_LOADED = "What opens the picture could not be fetched. Choose it again when there is a signal.";

async function prepare(file: File): Promise<Prepared> {
  const { preparePhoto } = await preparer().catch((cause: unknown) => {
    throw new PhotoFault(NOT_LOADED, { cause });
  });
  return preparePhoto(file);
}

let queue: UploadQueue | undefined;

/** The page's one queue. It lives outside every component, so that leaving a form does not stop what it started. */
export function pageQueue(): UploadQueue {
  return (queue ??= new UploadQueue({ prepare, announce: announcePhoto, sendFile: async (order) => (await sender()).sendFile(order), store: phoneStore, now: () => Date.now(), alone }));
}

const NOTHING: readonly Entry[] = [];

/** Everything on its way, kept current. */
export const useEntries = () => useSyncExternalStore((listener) => pageQueue().subscribe(listener), () => pageQueue().snapshot(), () => NOTHING);
