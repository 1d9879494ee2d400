import { route } from "@/lib/entry/route";
import { getPrep } from "@/lib/prep/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getPrep(viewer, moveId));
