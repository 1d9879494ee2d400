import type { PhotoView } from "@/lib/evidence/types";

/** What a photo shows, as far as its record tells, and who took it. */
export const altOf = ({ name, takenBy, takenByCompany }: PhotoView) => `Photo ${name}, taken by ${takenBy}, ${takenByCompany}`;

/** A photo small; private, so it comes through a door that checks who asks. */
export function Thumbnail({ photo }: { photo: PhotoView }) {
  // The door redirects to another address each time, so an optimizer would have nothing to keep.
  // eslint-disable-next-line @next/next/no-img-element
  return <img src={photo.previewUrl} alt={altOf(photo)} width={72} height={72} loading="lazy" decoding="async" className="size-18 shrink-0 border border-rule bg-manila object-cover" />;
}
