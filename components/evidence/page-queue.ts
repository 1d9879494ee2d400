import { useSyncExternalStore } from "react";
import { announcePhoto } from "@/lib/evidence/options";
import { phoneStore } from "./phone-store";
import { preparePhoto } from "./prepare";
import { UploadQueue, type Entry } from "./queue";
import { sendFile } from "./send-file";

/** Two tabs of one person must not send the same photo; a browser without locks leaves it to the server, which keeps one. */
async function alone(clientId: string, run: () => Promise<void>): Promise<boolean> {
  if (!navigator.locks) return run().then(() => true);
  return navigator.locks.request(`towfolio-photo-${clientId}`, { ifAvailable: true }, async (lock) => {
    if (lock) await run();
    return lock !== null;
  });
}

let queue: UploadQueue | undefined;

/** The page's one queue. It lives outside every component, so that leaving a form does not stop what it started. */
export function pageQueue(): UploadQueue {
  return (queue ??= new UploadQueue({ prepare: preparePhoto, announce: announcePhoto, sendFile, store: phoneStore, now: () => Date.now(), alone }));
}

const NOTHING: readonly Entry[] = [];

/** Everything on its way, kept current. */
export const useEntries = () => useSyncExternalStore((listener) => pageQueue().subscribe(listener), () => pageQueue().snapshot(), () => NOTHING);
