"use client";

import { useEffect, useRef } from "react";

const SIDE_PX = 72;

/** The small picture of a photo that only this phone has so far. */
export function ProofPicture({ proof, name }: { proof: Blob | null; name: string }) {
  const canvas = useRef<HTMLCanvasElement>(null);

  useEffect(() => {
    let current = true;
    if (proof) {
      createImageBitmap(proof).then((bitmap) => {
        const pen = current ? canvas.current?.getContext("2d") : null;
        const scale = (2 * SIDE_PX) / Math.min(bitmap.width, bitmap.height);
        const [width, height] = [bitmap.width * scale, bitmap.height * scale];
        pen?.drawImage(bitmap, SIDE_PX - width / 2, SIDE_PX - height / 2, width, height);
        bitmap.close();
      }, () => undefined);
    }
    return () => {
      current = false;
    };
  }, [proof]);

  return <canvas ref={canvas} role="img" aria-label={`${name}, not sent yet`} width={2 * SIDE_PX} height={2 * SIDE_PX} className="size-18 shrink-0 border border-rule bg-manila" />;
}
