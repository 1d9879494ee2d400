"use client";

import { useState } from "react";
import { Dialog } from "@/components/ui/dialog";
import type { PhotoView } from "@/lib/evidence/types";
import { wordsOfPhoto } from "@/lib/evidence/words";
import { PhotoFacts } from "./photo-facts";
import { altOf, Thumbnail } from "./thumbnail";

/** Photos of one thing, small; each opens big with what is known of it. */
export function PhotoStrip({ photos }: { photos: PhotoView[] }) {
  const [openId, setOpenId] = useState<string | null>(null);
  const open = photos.find(({ id }) => id === openId);
  if (photos.length === 0) return null;
  return (
    <>
      <ul aria-label="Photos" className="flex flex-wrap gap-2.5">
        {photos.map((photo) => (
          <li key={photo.id} className="w-18">
            <button type="button" onClick={() => setOpenId(photo.id)} className="block">
              <Thumbnail photo={photo} />
            </button>
            {wordsOfPhoto(photo) && <p className={photo.state === "refused" ? "text-13 font-[620] text-oxide max-sm:text-14" : "text-13 text-ink-2 max-sm:text-14"}>{photo.state === "refused" ? "Original refused" : wordsOfPhoto(photo)}</p>}
          </li>
        ))}
      </ul>
      <Dialog wide open={open !== undefined} onClose={() => setOpenId(null)} title={<span className="[overflow-wrap:anywhere]">{open?.name}</span>}>
        {open && (
          <>
            {/* eslint-disable-next-line @next/next/no-img-element -- private, through a door that redirects to another address each time */}
            <img src={open.previewUrl} alt={altOf(open)} width={open.widthPx ?? undefined} height={open.heightPx ?? undefined} className="mx-auto mb-4 h-auto max-h-[65dvh] w-auto max-w-full bg-manila" />
            <PhotoFacts photo={open} />
          </>
        )}
      </Dialog>
    </>
  );
}
