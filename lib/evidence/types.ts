import type { PhotoState, PhotoType } from "./vocabulary";

/** A photo as screens show it. Addresses are doors of ours, which check who asks. */
export type PhotoView = {
  id: string;
  moveId: string;
  state: PhotoState;
  /** The original is not here yet, or has not been checked yet. */
  pending: boolean;
  refusedWhy: string | null;
  name: string;
  type: PhotoType;
  sizeBytes: number;
  /** Of the original, computed on the phone before it was sent. */
  sha256: string;
  widthPx: number | null;
  heightPx: number | null;
  /** As the picture itself tells. */
  capturedAt: string | null;
  camera: string | null;
  place: { latitude: number; longitude: number } | null;
  takenBy: string;
  takenByCompany: string;
  /** When the phone announced it. */
  at: string;
  /** Zone of the move's origin, in which times are shown. */
  zone: string;
  /** Preview, or the proof while there is no preview. */
  previewUrl: string;
  /** Null until the original has arrived and its hash agrees. */
  originalUrl: string | null;
};

/** A photo in the list of a move. */
export type MovePhoto = PhotoView & {
  /** Evidence for something already. */
  used: boolean;
  /** Taken by the viewer. */
  mine: boolean;
};

/** Which of a photo's two files comes from the phone. */
export type Slot = "proof" | "original";

/** What the server has of a photo that a phone announced. */
export type Announced = { photo: PhotoView; proofHere: boolean; originalHere: boolean };

/** What was read from an original. */
export type PhotoFacts = {
  widthPx: number;
  heightPx: number;
  capturedAt: Date | null;
  latitude: number | null;
  longitude: number | null;
  camera: string | null;
};
