import { Box, BoxGrid } from "@/components/ui/box";
import { Mono } from "@/components/ui/text";
import type { PhotoView } from "@/lib/evidence/types";
import { wordsOfPhoto } from "@/lib/evidence/words";
import { formatFullWhen } from "@/lib/moves/when";

const sizeText = (bytes: number) => (bytes < 1024 * 1024 ? `${Math.max(1, Math.round(bytes / 1024))} KB` : `${(bytes / 1024 / 1024).toFixed(1)} MB`);

/** What is known of a photo, and the way to its original. */
export function PhotoFacts({ photo }: { photo: PhotoView }) {
  const { capturedAt, camera, place, takenBy, takenByCompany, at, zone, sha256, originalUrl, sizeBytes, widthPx, heightPx } = photo;
  const state = wordsOfPhoto(photo);
  return (
    <>
      <BoxGrid>
        <Box label="Taken" span={6} detail={capturedAt ? "As the picture says" : null}>
          {capturedAt ? formatFullWhen(capturedAt, zone) : state ? "Read when the original is here" : "The picture does not say"}
        </Box>
        <Box label="On file since" span={6} detail={`${takenBy}, ${takenByCompany}`}>
          {formatFullWhen(at, zone)}
        </Box>
        <Box label="Camera" span={6}>
          {camera ?? "Not told"}
        </Box>
        <Box label="Place" span={6} mono={place !== null}>
          {place ? `${place.latitude.toFixed(5)}, ${place.longitude.toFixed(5)}` : "Not told"}
        </Box>
        <Box label="SHA-256 of the original" span={12} detail={state ? "As the phone computed it" : "As the phone computed it; what arrived agrees"}>
          <Mono className="text-14 [overflow-wrap:anywhere]">
            <abbr title={sha256} className="no-underline">
              {sha256.slice(0, 16)}…
            </abbr>
          </Mono>
        </Box>
      </BoxGrid>
      <p className="mt-3 text-14">
        {originalUrl ? (
          <a href={originalUrl} className="font-[620] underline underline-offset-4">
            Original, {sizeText(sizeBytes)}
            {widthPx && heightPx ? `, ${widthPx} × ${heightPx} pixels` : ""}
          </a>
        ) : (
          state
        )}
      </p>
    </>
  );
}
