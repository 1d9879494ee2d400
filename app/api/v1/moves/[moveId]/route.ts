import { route } from "@/lib/entry/route";
import { getCaseFile } from "@/lib/moves/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getCaseFile(viewer, moveId));
