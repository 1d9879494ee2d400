import { say } from "./progress";

/** One running part of the site. A part inside the launcher's own process has no process id and does not end by itself. */
export type Part = { pid?: number; ended?: Promise<number>; stop: () => Promise<void> };

type Kept = { name: string; begin: () => Promise<Part>; part: Part; restarts: number[] };

const RESTARTS = 5;
const RESTART_WINDOW_MILLISECONDS = 60_000;

/** The parts of a running site in the order they were started; stopped in the opposite order, started again when one dies. */
export class Parts {
  readonly #kept: Kept[] = [];
  readonly #onChange: (pids: number[]) => void;
  #stopping = false;
  #giveUp: (name: string) => void = () => undefined;

  /** Resolves with the name of a part that died too often to be started again. */
  readonly givenUp = new Promise<string>((resolve) => (this.#giveUp = resolve));

  constructor(onChange: (pids: number[]) => void = () => undefined) {
    this.#onChange = onChange;
  }

  /** Starts a part, and from then on keeps it running. */
  async start<P extends Part>(name: string, begin: () => Promise<P>): Promise<P> {
    if (this.#stopping) throw new Error("Stopping: nothing more is started.");
    const part = await begin();
    const kept: Kept = { name, begin, part, restarts: [] };
    this.#kept.push(kept);
    this.#changed();
    if (this.#stopping) await this.#stopOne(kept);
    else this.#watch(kept);
    return part;
  }

  /** Stops all parts, the last started first. */
  async stop(): Promise<void> {
    this.#stopping = true;
    for (const kept of this.#kept.toReversed()) await this.#stopOne(kept);
  }

  async #stopOne(kept: Kept): Promise<void> {
    try {
      await kept.part.stop();
    } catch (fault) {
      say(`Stopping ${kept.name} failed: ${fault instanceof Error ? fault.message : String(fault)}`);
    }
  }

  #watch(kept: Kept): void {
    const { part } = kept;
    void part.ended?.then((code) => {
      if (!this.#stopping && kept.part === part) void this.#restart(kept, code);
    });
  }

  async #restart(kept: Kept, code: number): Promise<void> {
    const now = Date.now();
    kept.restarts = [...kept.restarts.filter((at) => now - at < RESTART_WINDOW_MILLISECONDS), now];
    if (kept.restarts.length > RESTARTS) return this.#giveUp(kept.name);
    say(`${kept.name} ended unexpectedly (code ${code}); it is being started again.`);
    try {
      kept.part = await kept.begin();
      this.#changed();
      if (this.#stopping) await this.#stopOne(kept);
      else this.#watch(kept);
    } catch (fault) {
      say(fault instanceof Error ? fault.message : String(fault));
      this.#giveUp(kept.name);
    }
  }

  #changed(): void {
    this.#onChange(this.#kept.flatMap(({ part }) => part.pid ?? []));
  }
}
