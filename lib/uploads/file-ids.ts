/** Id of ours that a photo's file carries at the file service, so that it is found when its arrival was not reported. */
export const fileIdOf = (photoId: string, slot: "proof" | "original" | "preview") => `${photoId}-${slot}`;
