import type { Slot } from "@/lib/evidence/types";
import type { Prepared } from "./prepare";

/** A photo kept on the phone until the server has its original, so that a closed page or a dead battery loses nothing. */
export type Unsent = { clientId: string; userId: string; moveId: string; prepared: Prepared; addresses: Partial<Record<Slot, SendAddress>>; at: number };

/** Where a file is sent; the same address again lets a file that broke off go on where it stopped. */
export type SendAddress = { answer: string; at: number };

/** Keeps unsent photos. Every call may fail: private windows and full phones have no room. */
export type PhoneStore = {
  save(photo: Unsent): Promise<void>;
  /** Only those of one person; somebody else on the same phone never sees them. */
  list(userId: string): Promise<Unsent[]>;
  drop(clientId: string): Promise<void>;
};

const NAME = "towfolio-photos";
const STORE = "unsent";
/** With less room than this the phone is not asked to keep more. */
const MIN_ROOM_BYTES = 200 * 1024 * 1024;

function settled<T>(request: IDBRequest<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error ?? new Error("The phone's store failed."));
  });
}

function opened(): Promise<IDBDatabase> {
  const request = indexedDB.open(NAME, 1);
  request.onupgradeneeded = () => void request.result.createObjectStore(STORE, { keyPath: "clientId" });
  return settled(request);
}

/** One step in the store, durable when it resolves. */
async function within<T>(mode: IDBTransactionMode, step: (store: IDBObjectStore) => IDBRequest<T>): Promise<T> {
  const base = await opened();
  try {
    const transaction = base.transaction(STORE, mode);
    const done = new Promise<void>((resolve, reject) => {
      transaction.oncomplete = () => resolve();
      transaction.onabort = () => reject(transaction.error ?? new Error("The phone has no room."));
    });
    const [answer] = await Promise.all([settled(step(transaction.objectStore(STORE))), done]);
    return answer;
  } finally {
    base.close();
  }
}

let asked = false;

async function requireRoom(): Promise<void> {
  // Browsers may tidy up what a site keeps, unless they have agreed not to.
  if (!asked) await navigator.storage?.persist?.();
  asked = true;
  const { quota, usage } = (await navigator.storage?.estimate?.()) ?? {};
  if (quota !== undefined && usage !== undefined && quota - usage < MIN_ROOM_BYTES) throw new Error("The phone has no room.");
}

/** The store of this browser. */
export const phoneStore: PhoneStore = {
  async save(photo) {
    await requireRoom();
    await within("readwrite", (store) => store.put(photo));
  },
  async list(userId) {
    const all = (await within("readonly", (store) => store.getAll())) as Unsent[];
    return all.filter((photo) => photo.userId === userId).sort((a, b) => a.at - b.at);
  },
  async drop(clientId) {
    await within("readwrite", (store) => store.delete(clientId));
  },
};
