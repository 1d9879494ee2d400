import { route } from "@/lib/entry/route";
import { getPhotoKey } from "@/lib/evidence/queries";
import { openFile } from "@/lib/uploads/files";

export const GET = route<{ moveId: string; photoId: string }>(async (viewer, { moveId, photoId }) => openFile(await getPhotoKey(viewer, moveId, photoId, "preview")));
