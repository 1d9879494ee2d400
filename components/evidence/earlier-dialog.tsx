import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import type { PhotoView } from "@/lib/evidence/types";
import { Thumbnail } from "./thumbnail";

export type EarlierDialogProps = { photos: readonly PhotoView[]; onUse: (photo: PhotoView) => void; onClose: () => void };

/** The photos that were sent before, each to be taken into the form. */
export function EarlierDialog({ photos, onUse, onClose }: EarlierDialogProps) {
  return (
    <Dialog open onClose={onClose} title="Photos sent earlier, not used yet">
      {photos.length === 0 && <p>There is none. A photo that you send and then don’t use is found here.</p>}
      <ul className="text-14">
        {photos.map((photo) => (
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
  );
}
