import { route } from "@/lib/entry/route";
import { getMovement } from "@/lib/movement/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getMovement(viewer, moveId));
