import { route } from "@/lib/entry/route";
import { getFees } from "@/lib/fees/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getFees(viewer, moveId));
