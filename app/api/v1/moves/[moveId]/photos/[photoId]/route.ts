import { route } from "@/lib/entry/route";
import { getPhoto } from "@/lib/evidence/queries";

export const GET = route<{ moveId: string; photoId: string }>((viewer, { moveId, photoId }) => getPhoto(viewer, moveId, photoId));
