"use client";

import { useEffect, useState } from "react";
import { Button } from "@/components/ui/button";
import { later } from "@/components/ui/later";
import { read } from "@/lib/entry/fetcher";
import type { MovePhoto, PhotoView } from "@/lib/evidence/types";
import { routes } from "@/lib/routes";

const EarlierDialog = later(() => import("./earlier-dialog").then((file) => file.EarlierDialog));

/** Photos that the person sent before and that nothing points to yet: a form that was closed half way loses none. */
export function EarlierPhotos({ moveId, taken, onUse }: { moveId: string; taken: readonly PhotoView[]; onUse: (photo: PhotoView) => void }) {
  const [found, setFound] = useState<MovePhoto[] | null>(null);
  const [fault, setFault] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  useEffect(() => void EarlierDialog.load().catch(() => undefined), []);

  const look = async () => {
    setBusy(true);
    setFault(null);
    try {
      const [all] = await Promise.all([read<MovePhoto[]>(routes.api.photos(moveId)), EarlierDialog.load()]);
      setFound(all.filter(({ mine, used, state }) => mine && !used && (state === "proof" || state === "kept")));
    } catch (error) {
      setFault(error instanceof Error && error.name === "CallError" ? error.message : "That did not go through. Try again when there is a signal.");
    }
    setBusy(false);
  };

  return (
    <>
      <Button variant="plain" busy={busy} busyWords="Looking…" onClick={() => void look()}>
        Photos sent earlier
      </Button>
      {fault && <p role="status" className="text-14 text-oxide">{fault}</p>}
      {found && <EarlierDialog photos={found.filter(({ id }) => !taken.some((photo) => photo.id === id))} onUse={onUse} onClose={() => setFound(null)} />}
    </>
  );
}
