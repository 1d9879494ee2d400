"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { read } from "@/lib/entry/fetcher";
import type { MovePhoto, PhotoView } from "@/lib/evidence/types";
import { routes } from "@/lib/routes";
import { Thumbnail } from "./thumbnail";

type Found = { photos: MovePhoto[]; fault: string | null };

/** Photos that the person sent before and that nothing points to yet: a form that was closed half way loses none. */
export function EarlierPhotos({ moveId, taken, onUse }: { moveId: string; taken: readonly PhotoView[]; onUse: (photo: PhotoView) => void }) {
  const [found, setFound] = useState<Found | null>(null);
  const [busy, setBusy] = useState(false);

  const look = async () => {
    setBusy(true);
    const answer = await read<MovePhoto[]>(routes.api.photos(moveId)).then(
      (all): Found => ({ photos: all.filter(({ mine, used, state }) => mine && !used && (state === "proof" || state === "kept")), fault: null }),
      (error: unknown): Found => ({ photos: [], fault: error instanceof Error ? error.message : "That did not go through." }),
    );
    setFound(answer);
    setBusy(false);
  };

  const free = found?.photos.filter(({ id }) => !taken.some((photo) => photo.id === id)) ?? [];
  return (
    <>
      <Button variant="plain" busy={busy} busyWords="Looking…" onClick={() => void look()}>
        Photos sent earlier
      </Button>
      <Dialog open={found !== null} onClose={() => setFound(null)} title="Photos sent earlier, not used yet">
        {free.length === 0 && <p>{found?.fault ?? "There is none. A photo that you send and then don’t use is found here."}</p>}
        <ul className="text-14">
          {free.map((photo) => (
            <li key={photo.id} className="flex items-center gap-3 border-b border-rule py-2 last:border-b-0">
              <Thumbnail photo={photo} />
              <p className="min-w-0 grow truncate">{photo.name}</p>
              <Button variant="ghost" size="small" onClick={() => onUse(photo)}>
                Use<span className="sr-only"> {photo.name}</span>
              </Button>
            </li>
          ))}
        </ul>
      </Dialog>
    </>
  );
}
