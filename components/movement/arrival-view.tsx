import { PhotoStrip } from "@/components/evidence/photo-strip";
import { formatDay, formatWhen } from "@/lib/moves/when";
import type { ArrivalView } from "@/lib/movement/types";

/** What the receiver found, signed. */
export function ArrivalSigned({ arrival, zone }: { arrival: ArrivalView; zone: string }) {
  return (
    <div className="grid gap-2 text-15">
      <p className="max-w-[66ch] whitespace-pre-line">{arrival.condition}</p>
      {arrival.missing ? (
        <p className="max-w-[66ch] whitespace-pre-line">
          <b>Missing or damaged:</b> {arrival.missing}
        </p>
      ) : (
        <p className="text-14 text-ink-2">Nothing written down as missing or damaged.</p>
      )}
      <PhotoStrip photos={arrival.photos} />
      <p className="text-14 text-ink-2">
        Looked over on {formatDay(arrival.arrivedOn)}. Signed by {arrival.signedAs}, {formatWhen(arrival.at, zone)}.
      </p>
    </div>
  );
}
