import type { Slot } from "@/lib/evidence/types";
import type { SendAddress } from "./phone-store";

/** One file to be sent, and how its sender hears of it. */
export type SendOrder = {
  photoId: string;
  slot: Slot;
  file: File;
  /** From an earlier try that broke off. */
  address: SendAddress | null;
  /** A new address came, or null: the old one is of no use any more. */
  onAddress: (address: SendAddress | null) => void;
  onPercent: (percent: number) => void;
  signal: AbortSignal;
};

/** A file that can't be taken, said in words for the person who chose it. */
export class PhotoFault extends Error {
  override name = "PhotoFault";
}

/** What the service or our server said against a file, in contrast to a line that broke. */
export class SendRefused extends Error {
  override name = "SendRefused";
}

/** A file went out whole, and the server has not heard of it. */
export class NotReported extends Error {
  override name = "NotReported";
}
