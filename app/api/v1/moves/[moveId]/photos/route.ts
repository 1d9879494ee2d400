import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { announcePhoto } from "@/lib/evidence/commands";
import { announcePhotoInput } from "@/lib/evidence/input";
import { listPhotos } from "@/lib/evidence/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => listPhotos(viewer, moveId));
export const POST = command(announcePhotoInput, announcePhoto);
