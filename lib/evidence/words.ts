/** How far the sending of one photo is. `waiting` for its turn or for a connection; `stopped` until somebody presses; `refused` for good. */
export type SendingStep = "preparing" | "waiting" | "proof" | "original" | "done" | "stopped" | "refused";

export type Sending = { step: SendingStep; percent: number; proofSent: boolean; fault: string | null };

/** What stands beside a photo while it is sent, in words. */
export function wordsOfSending({ step, percent, proofSent, fault }: Sending): string {
  if (step === "preparing") return "Getting ready";
  if (step === "proof") return `Sending the proof, ${percent} %`;
  if (step === "original") return `Proof sent, original ${percent} %`;
  if (step === "done") return "Sent, proof and original";
  if (step === "refused") return fault ?? "Not taken.";
  const state = proofSent ? "Proof sent, original waiting" : "Waiting to be sent";
  if (step === "stopped") return `${state}. ${fault ?? "It did not go through."}`;
  return fault ? `${state}. ${fault} It is tried again by itself.` : state;
}

/** One line on everything that is on its way: "2 photos are being sent; 1 original is still to come." */
export function wordsOfQueue(all: readonly Sending[]): string | null {
  const open = all.filter(({ step }) => step !== "done" && step !== "refused");
  if (open.length === 0) return null;
  const proofs = open.filter(({ proofSent }) => !proofSent).length;
  const originals = open.length - proofs;
  const parts = [
    proofs > 0 ? `${proofs} ${proofs === 1 ? "photo is" : "photos are"} being sent` : null,
    originals > 0 ? `${originals} ${originals === 1 ? "original is" : "originals are"} still to come` : null,
  ].filter((part) => part !== null);
  return `${parts.join("; ")}. Leave this page open until it is done.`;
}

const STEPS_SECONDS = [1, 2, 5, 10, 20, 30, 60, 60];

/** How long to wait after so many failed tries; null when it is left to the person. */
export const retrySeconds = (tries: number): number | null => STEPS_SECONDS[tries - 1] ?? null;

/** Where a photo stands, in words, once the server knows it. */
export function wordsOfPhoto({ state, refusedWhy }: { state: "registered" | "proof" | "kept" | "refused"; refusedWhy: string | null }): string | null {
  if (state === "registered") return "Not here yet";
  if (state === "proof") return "Original pending";
  if (state === "refused") return `Original refused. ${refusedWhy ?? ""}`.trim();
  return null;
}
