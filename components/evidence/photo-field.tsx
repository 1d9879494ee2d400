"use client";

import { useEffect, useId, useState } from "react";
import { Button } from "@/components/ui/button";
import { FieldError, FieldHint } from "@/components/ui/field";
import { FileButton } from "@/components/ui/file-button";
import type { PhotoView } from "@/lib/evidence/types";
import { PHOTOS_PER_SUBJECT } from "@/lib/evidence/vocabulary";
import { wordsOfPhoto } from "@/lib/evidence/words";
import { EarlierPhotos } from "./earlier-photos";
import { EntryRow, EntryState } from "./entry-row";
import { loadSender, pageQueue, useEntries } from "./page-queue";
import { Thumbnail } from "./thumbnail";

export type PhotoFieldProps = {
  moveId: string;
  label: string;
  hint?: string;
  /** Photos that the form may use: those whose proof has arrived. */
  value: PhotoView[];
  onChange: (photos: PhotoView[]) => void;
  error?: string | null | undefined;
};

// HEIC is left out on purpose: asked for these three, an iPhone hands over a JPEG of its own making, with time and place still in it. A HEIC that comes all the same is turned or refused.
const ACCEPT = "image/jpeg,image/png,image/webp";

/** Takes or chooses photos and sends them while the rest of the form is filled; a photo counts once its proof has arrived, its original follows by itself. */
export function PhotoField({ moveId, label, hint, value, onChange, error }: PhotoFieldProps) {
  const id = useId();
  const entries = useEntries();
  const [over, setOver] = useState(false);
  const own = entries.filter((entry) => entry.field === id);

  // While there is a signal: in a yard it may be gone by the time the photo is taken.
  useEffect(() => void loadSender().catch(() => undefined), []);

  // The queue is outside of React: what has become usable there is handed to the form here, once.
  useEffect(() => {
    const arrived = own.flatMap(({ clientId, proofSent, photo }) => (proofSent && photo && pageQueue().handOver(clientId) ? [photo] : []));
    if (arrived.length > 0) onChange([...value, ...arrived]);
  }, [own, value, onChange]);

  const choose = (input: HTMLInputElement) => {
    const files = [...(input.files ?? [])];
    // So that the same file can be chosen again after it was removed.
    input.value = "";
    const room = PHOTOS_PER_SUBJECT - value.length - own.length;
    setOver(files.length > room);
    void pageQueue().add(moveId, id, files.slice(0, Math.max(0, room)), value.map(({ sha256 }) => sha256));
  };

  const remove = (photo: PhotoView) => {
    const entry = entries.find((one) => one.photo?.id === photo.id);
    if (entry) pageQueue().cancel(entry.clientId);
    onChange(value.filter(({ id: other }) => other !== photo.id));
  };

  const fault = error ?? (over ? `At most ${PHOTOS_PER_SUBJECT} photos fit here; the rest was left out.` : null);
  const described = [hint ? `${id}-hint` : null, fault ? `${id}-error` : null].filter((part) => part !== null).join(" ");
  return (
    <fieldset aria-describedby={described || undefined} className="min-w-0">
      <legend className="lab mb-1">{label}</legend>
      {hint && <FieldHint id={id}>{hint}</FieldHint>}
      {value.length + own.length > 0 && (
        <ul aria-live="polite" className="mb-2.5 border-y border-rule text-14">
          {value.map((photo) => (
            <ChosenPhoto key={photo.id} photo={photo} onRemove={() => remove(photo)} />
          ))}
          {own.map((entry) => (
            <EntryRow key={entry.clientId} entry={entry} />
          ))}
        </ul>
      )}
      <div className="flex flex-wrap gap-2.5">
        <FileButton id={`${id}-take`} name="" label="Take a photo" accept={ACCEPT} capture="environment" className="hidden pointer-coarse:block" onChange={(event) => choose(event.currentTarget)} />
        <FileButton id={`${id}-choose`} name="" label="Choose photos" accept={ACCEPT} multiple onChange={(event) => choose(event.currentTarget)} />
        <EarlierPhotos moveId={moveId} taken={value} onUse={(photo) => onChange([...value, photo])} />
      </div>
      {fault && <FieldError id={id}>{fault}</FieldError>}
    </fieldset>
  );
}

/** A photo that the form has; its original may still be on its way. */
function ChosenPhoto({ photo, onRemove }: { photo: PhotoView; onRemove: () => void }) {
  const entry = useEntries().find((one) => one.photo?.id === photo.id);
  return (
    <li className="flex items-start gap-3 border-b border-rule py-2 last:border-b-0">
      <Thumbnail photo={photo} />
      {entry ? (
        <EntryState entry={entry} onRemove={onRemove} />
      ) : (
        <div className="min-w-0 grow">
          <p className="truncate font-[620]">{photo.name}</p>
          <p>{wordsOfPhoto(photo) ?? "Sent, proof and original"}</p>
          <Button variant="plain" size="small" onClick={onRemove}>
            Remove<span className="sr-only"> {photo.name}</span>
          </Button>
        </div>
      )}
    </li>
  );
}
