import { CallError } from "@/lib/entry/fetcher";
import { readForm, type DraftForm } from "@/lib/moves/draft";
import type { Draft, SavedDraft } from "@/lib/moves/types";

/** How keeping stands: `unsent` means that the page holds more than the server. */
export type SaveStatus =
  | { kind: "new" | "unsent" | "saving" }
  | { kind: "saved"; at: string }
  | { kind: "failed"; message: string; again: boolean }
  | { kind: "conflict"; theirs: DraftForm }
  /** Somebody opened or discarded the draft meanwhile. */
  | { kind: "gone" };

/** The calls that a saver makes. */
export type SaverCalls = {
  begin: (companyId: string, body: DraftForm, key: string) => Promise<SavedDraft>;
  save: (draftId: string, companyId: string, body: DraftForm, version: number) => Promise<SavedDraft>;
  read: (draftId: string) => Promise<Draft>;
  /** Told once, when a new draft got its id. */
  began: (draftId: string) => void;
};

const PAUSE_MS = 800;
const AGAIN_MS = 5_000;

/** Keeps a form as a draft while it is written: after a pause in typing, one call at a time, again by itself when the connection was lost. */
export class DraftSaver {
  private readonly calls: SaverCalls;
  private beginKey = crypto.randomUUID();
  private known: { draftId: string; version: number } | null;
  private form: DraftForm;
  private kept: string;
  private timer: ReturnType<typeof setTimeout> | undefined;
  private running: Promise<void> | null = null;
  private stopped = false;
  private status: SaveStatus;
  private readonly listeners = new Set<() => void>();

  constructor(form: DraftForm, draft: Pick<Draft, "draftId" | "version" | "updatedAt"> | null, calls: SaverCalls) {
    this.calls = calls;
    this.form = form;
    this.kept = JSON.stringify(form);
    this.known = draft;
    this.status = draft ? { kind: "saved", at: draft.updatedAt } : { kind: "new" };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly getStatus = (): SaveStatus => this.status;

  get draftId(): string | null {
    return this.known?.draftId ?? null;
  }

  /** Takes the form as it stands now and keeps it after a pause. */
  change(form: DraftForm): void {
    this.form = form;
    if (this.halted() || JSON.stringify(form) === this.kept) return;
    if (this.status.kind !== "saving") this.tell({ kind: "unsent" });
    this.later(PAUSE_MS);
  }

  /** Keeps what is not kept yet, at once. */
  async flush(): Promise<void> {
    clearTimeout(this.timer);
    await this.running;
    if (this.halted() || JSON.stringify(this.form) === this.kept) return;
    this.running = this.send();
    await this.running;
  }

  /** Ends a conflict: the form that shall stand is kept over what was saved meanwhile. */
  settle(form: DraftForm): void {
    this.form = form;
    this.tell({ kind: "unsent" });
    void this.flush();
  }

  /** Nothing is kept any more: the move was opened. */
  stop(): void {
    this.stopped = true;
    clearTimeout(this.timer);
  }

  /** Takes up keeping again, when opening was refused. */
  resume(): void {
    this.stopped = false;
    this.change(this.form);
  }

  /** The draft is not there any more; what was typed stays on the page. */
  lose(): void {
    clearTimeout(this.timer);
    this.tell({ kind: "gone" });
  }

  /** Keeps what is on the page as another draft. */
  keepAnew(): void {
    this.known = null;
    this.kept = "";
    this.beginKey = crypto.randomUUID();
    this.stopped = false;
    this.tell({ kind: "unsent" });
    void this.flush();
  }

  private halted(): boolean {
    return this.stopped || this.status.kind === "conflict" || this.status.kind === "gone";
  }

  private later(ms: number) {
    clearTimeout(this.timer);
    this.timer = setTimeout(() => void this.flush(), ms);
  }

  private tell(status: SaveStatus) {
    this.status = status;
    for (const listener of this.listeners) listener();
  }

  private async send(): Promise<void> {
    const form = this.form;
    this.tell({ kind: "saving" });
    try {
      const saved = this.known ? await this.calls.save(this.known.draftId, form.companyId, form, this.known.version) : await this.calls.begin(form.companyId, form, this.beginKey);
      const first = this.known === null;
      this.known = saved;
      this.kept = JSON.stringify(form);
      this.tell({ kind: "saved", at: saved.updatedAt });
      if (first) this.calls.began(saved.draftId);
    } catch (error) {
      await this.failed(error);
    } finally {
      this.running = null;
    }
    // Typing went on while the call was under way.
    if (this.status.kind === "saved" && JSON.stringify(this.form) !== this.kept) this.change(this.form);
  }

  private async failed(error: unknown): Promise<void> {
    const status = error instanceof CallError ? error.status : 0;
    if (status === 409 && this.known) {
      try {
        const theirs = await this.calls.read(this.known.draftId);
        this.known = theirs;
        this.tell({ kind: "conflict", theirs: readForm(theirs.body, theirs.companyId) });
        return;
      } catch {
        // The draft can't be read either; said below.
      }
    }
    if (status === 404 && this.known) return this.lose();
    const again = status === 0 || status >= 500 || status === 429;
    this.tell({ kind: "failed", message: error instanceof Error ? error.message : "That did not go through.", again });
    if (again) this.later(AGAIN_MS);
  }
}
