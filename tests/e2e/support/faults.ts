const INGEST = process.env.UPLOADTHING_INGEST_URL ?? "http://localhost:4028";

export type UploadFault = { kind: "cut-mid-file" | "callback-late" | "callback-never" | "slow" | "off"; times?: number; ms?: number; afterBytes?: number };

/** Has the stand-in of the file service do wrong, so many times. */
export async function orderFault(fault: UploadFault): Promise<void> {
  const answer = await fetch(`${INGEST}/faults`, { method: "POST", headers: { "content-type": "application/json" }, body: JSON.stringify(fault) });
  if (!answer.ok) throw new Error(`the fault ${fault.kind} was not taken: ${await answer.text()}`);
}

/** True for a request that carries a file to the file service. */
export const isSending = (request: { method: () => string; url: () => string }) => request.method() === "PUT" && request.url().startsWith(INGEST);
