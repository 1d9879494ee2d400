import { CallError } from "@/lib/entry/fetcher";
import type { AnnouncePhoto } from "@/lib/evidence/input";
import type { Announced, PhotoView, Slot } from "@/lib/evidence/types";
import { retrySeconds, type Sending } from "@/lib/evidence/words";
import type { PhoneStore, Unsent } from "./phone-store";
import type { Prepared } from "./prepare";
import { NotReported, PhotoFault, SendRefused, type SendOrder } from "./send-order";

/** One photo on its way, as a screen shows it. A new object for every change. */
export type Entry = Sending & {
  clientId: string;
  moveId: string;
  /** The form field that waits for it; null once the field has it, or when the page was loaded anew. */
  field: string | null;
  name: string;
  sha256: string | null;
  proof: Blob | null;
  photo: PhotoView | null;
  /** The phone could not keep it, so closing the page would lose it. */
  onlyHere: boolean;
};

/** What the queue works with; tests give their own. */
export type QueueParts = {
  prepare: (file: File) => Promise<Prepared>;
  announce: (given: AnnouncePhoto) => Promise<Announced>;
  sendFile: (order: SendOrder) => Promise<boolean>;
  store: PhoneStore;
  now: () => number;
  /** Runs unless another tab is at the same photo; false when one is. */
  alone: (clientId: string, run: () => Promise<void>) => Promise<boolean>;
};

type Job = Pick<Unsent, "clientId" | "moveId" | "addresses" | "at"> & { prepared: Prepared; announced: Announced | null; tries: number; dueAt: number; abort: AbortController | null };

const YIELD = "a proof goes first";
const CANCEL = "cancelled";
const OTHER_TAB_MS = 5000;

/** Sends photos one file at a time, every proof before any original, again and again until they are there. */
export class UploadQueue {
  #entries: readonly Entry[] = [];
  readonly #jobs = new Map<string, Job>();
  readonly #listeners = new Set<() => void>();
  #userId: string | null = null;
  #busy = false;
  #timer: ReturnType<typeof setTimeout> | undefined;

  constructor(private readonly parts: QueueParts) {}

  readonly subscribe = (listener: () => void) => {
    this.#listeners.add(listener);
    return () => void this.#listeners.delete(listener);
  };

  readonly snapshot = () => this.#entries;

  /** Binds what is kept on the phone to a person, and takes up what an earlier page of theirs left unsent. */
  async openFor(userId: string): Promise<void> {
    if (this.#userId === userId) return;
    this.#userId = userId;
    for (const { clientId, moveId, prepared, addresses, at } of await this.parts.store.list(userId).catch(() => [])) {
      if (this.#jobs.has(clientId)) continue;
      this.#show({ clientId, moveId, field: null, name: prepared.name, sha256: prepared.sha256, proof: prepared.proof, photo: null, onlyHere: false, step: "waiting", percent: 0, proofSent: false, fault: null });
      this.#jobs.set(clientId, { clientId, moveId, prepared, addresses, at, announced: null, tries: 0, dueAt: 0, abort: null });
    }
    void this.#pump();
  }

  /** Takes chosen files; each shows up at once and is sent when its turn comes. The field has photos with the hashes `had` already. */
  async add(moveId: string, field: string, files: readonly File[], had: readonly string[] = []): Promise<void> {
    const known = new Set(had);
    const chosen = files.map((file) => ({ file, clientId: crypto.randomUUID() }));
    for (const { file, clientId } of chosen) this.#show({ clientId, moveId, field, name: file.name, sha256: null, proof: null, photo: null, onlyHere: false, step: "preparing", percent: 0, proofSent: false, fault: null });
    // One after the other: opening several large pictures at once is more than a phone's memory takes.
    for (const { file, clientId } of chosen) await this.#prepare(clientId, moveId, file, known);
  }

  async #prepare(clientId: string, moveId: string, file: File, known: Set<string>): Promise<void> {
    try {
      const prepared = await this.parts.prepare(file);
      const entry = this.#entry(clientId);
      if (!entry) return;
      const { sha256 } = prepared;
      if (known.has(sha256) || this.#entries.some((other) => other.field === entry.field && other.sha256 === sha256)) throw new PhotoFault("This picture is here already.");
      known.add(sha256);
      const job: Job = { clientId, moveId, prepared, addresses: {}, at: this.parts.now(), announced: null, tries: 0, dueAt: 0, abort: null };
      this.#jobs.set(clientId, job);
      this.#change(clientId, { step: "waiting", name: prepared.name, sha256, proof: prepared.proof, onlyHere: !(await this.#save(job)) });
    } catch (error) {
      this.#change(clientId, { step: "refused", fault: error instanceof PhotoFault ? error.message : "This browser could not open the picture." });
      return;
    }
    for (const { clientId: other, step } of this.#entries) if (step === "original") this.#jobs.get(other)?.abort?.abort(YIELD);
    void this.#pump();
  }

  async #save({ clientId, moveId, prepared, addresses, at }: Job): Promise<boolean> {
    const userId = this.#userId;
    if (!userId) return false;
    return this.parts.store.save({ clientId, userId, moveId, prepared, addresses, at }).then(() => true, () => false);
  }

  /** The field has taken the photo over; true the first time. */
  handOver(clientId: string): boolean {
    if (this.#entry(clientId)?.field == null) return false;
    this.#change(clientId, { field: null });
    return true;
  }

  /** Stops sending a photo and forgets it, here and on the phone. */
  cancel(clientId: string): void {
    const job = this.#jobs.get(clientId);
    this.#jobs.delete(clientId);
    job?.abort?.abort(CANCEL);
    this.#set(this.#entries.filter((entry) => entry.clientId !== clientId));
    void this.parts.store.drop(clientId).catch(() => undefined);
  }

  /** Tries again at once: one photo, or after a pause in the connection all that wait. */
  retry(clientId?: string): void {
    for (const job of this.#jobs.values()) {
      const step = this.#entry(job.clientId)?.step;
      if (clientId === undefined ? step !== "waiting" : job.clientId !== clientId) continue;
      job.dueAt = 0;
      job.tries = 0;
      if (step === "stopped" || step === "refused") this.#change(job.clientId, { step: "waiting", fault: null });
    }
    void this.#pump();
  }

  async #pump(): Promise<void> {
    if (this.#busy) return;
    this.#busy = true;
    clearTimeout(this.#timer);
    for (let job = this.#next(); job; job = this.#next()) await this.#work(job);
    this.#busy = false;
    const due = [...this.#jobs.values()].filter(({ clientId }) => this.#entry(clientId)?.step === "waiting").map(({ dueAt }) => dueAt);
    if (due.length > 0) this.#timer = setTimeout(() => void this.#pump(), Math.max(50, Math.min(...due) - this.parts.now()));
  }

  #next(): Job | undefined {
    const ready = [...this.#jobs.values()].filter(({ clientId, dueAt }) => this.#entry(clientId)?.step === "waiting" && dueAt <= this.parts.now());
    return ready.find(({ clientId }) => !this.#entry(clientId)?.proofSent) ?? ready[0];
  }

  async #work(job: Job): Promise<void> {
    const abort = new AbortController();
    job.abort = abort;
    try {
      const mine = await this.parts.alone(job.clientId, () => this.#sendNext(job, abort.signal));
      if (!mine) job.dueAt = this.parts.now() + OTHER_TAB_MS;
    } catch (error) {
      if (abort.signal.reason === CANCEL) return;
      if (abort.signal.reason === YIELD) return this.#change(job.clientId, { step: "waiting" });
      job.announced = null;
      this.#failed(job, error);
    } finally {
      job.abort = null;
    }
  }

  /** Sends one file of a photo: the proof, or when that is there the original. */
  async #sendNext(job: Job, signal: AbortSignal): Promise<void> {
    if (!job.announced) await this.#ask(job);
    const slot = this.#missing(job);
    if (!slot) return this.#finish(job);
    this.#change(job.clientId, { step: slot, percent: 0 });
    if (!(await this.#sendSlot(job, slot, signal))) await this.#ask(job);
    else if (job.announced) job.announced = { ...job.announced, [slot === "proof" ? "proofHere" : "originalHere"]: true };
    if (this.#missing(job) === slot) throw new NotReported("The file service has not reported it yet.");
    job.tries = 0;
    if (this.#missing(job)) this.#change(job.clientId, { step: "waiting", percent: 0, fault: null, ...this.#usable(job) });
    else this.#finish(job);
  }

  /** Announces the photo, or asks anew what the server has of it. */
  async #ask(job: Job): Promise<void> {
    const { name, type, sizeBytes, sha256, widthPx, heightPx } = job.prepared;
    job.announced = await this.parts.announce({ moveId: job.moveId, clientId: job.clientId, name, type, sizeBytes, sha256, widthPx, heightPx });
    const { photo, proofHere } = job.announced;
    if (photo.state === "refused") throw new SendRefused(photo.refusedWhy ?? "The photo was refused.");
    this.#change(job.clientId, proofHere ? this.#usable(job) : { photo });
  }

  #usable({ announced }: Job): Partial<Entry> {
    if (!announced?.proofHere) return {};
    const state = announced.photo.state === "registered" ? "proof" : announced.photo.state;
    return { proofSent: true, photo: { ...announced.photo, state } };
  }

  #missing({ announced }: Job): Slot | null {
    return !announced?.proofHere ? "proof" : announced.originalHere ? null : "original";
  }

  async #sendSlot(job: Job, slot: Slot, signal: AbortSignal): Promise<boolean> {
    const { prepared, announced, clientId } = job;
    const [blob, type] = slot === "proof" ? [prepared.proof, "image/jpeg"] : [prepared.original, prepared.type];
    const onAddress: SendOrder["onAddress"] = (address) => {
      if (address) job.addresses[slot] = address;
      else delete job.addresses[slot];
      if (!this.#entry(clientId)?.onlyHere) void this.#save(job);
    };
    const onPercent = (percent: number) => this.#entry(clientId)?.percent !== percent && !signal.aborted && this.#change(clientId, { percent });
    return this.parts.sendFile({ photoId: announced?.photo.id ?? "", slot, file: new File([blob], prepared.name, { type }), address: job.addresses[slot] ?? null, onAddress, onPercent, signal });
  }

  #finish(job: Job): void {
    this.#jobs.delete(job.clientId);
    this.#change(job.clientId, { step: "done", percent: 100, fault: null, ...this.#usable(job) });
    void this.parts.store.drop(job.clientId).catch(() => undefined);
  }

  #failed(job: Job, error: unknown): void {
    job.tries += 1;
    const status = error instanceof CallError ? error.status : null;
    const final = (status !== null && status >= 400 && status < 500 && ![401, 403, 408, 425, 429].includes(status)) || (error instanceof SendRefused && job.tries > 2);
    const fault = error instanceof CallError || error instanceof SendRefused || error instanceof NotReported ? firstWords(error) : "The connection broke off.";
    const seconds = retrySeconds(job.tries);
    if (final) return this.#change(job.clientId, { step: "refused", fault });
    if (status === 401 || status === 403 || seconds === null) return this.#change(job.clientId, { step: "stopped", fault: status === 401 ? "You are signed out. Sign in again in this browser, then try again." : fault });
    job.dueAt = this.parts.now() + seconds * 1000;
    this.#change(job.clientId, { step: "waiting", percent: 0, fault });
  }

  #entry = (clientId: string) => this.#entries.find((entry) => entry.clientId === clientId);

  #show(entry: Entry): void {
    this.#set([...this.#entries, entry]);
  }

  #change(clientId: string, change: Partial<Entry>): void {
    this.#set(this.#entries.map((entry) => (entry.clientId === clientId ? { ...entry, ...change } : entry)));
  }

  #set(entries: readonly Entry[]): void {
    this.#entries = entries;
    for (const listener of this.#listeners) listener();
  }
}

/** A refused announcement says most in the words beside its field. */
function firstWords(error: Error): string {
  const [words] = error instanceof CallError ? Object.values(error.fields).flat() : [];
  return words ?? error.message;
}
