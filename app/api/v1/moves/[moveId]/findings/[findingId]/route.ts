import { route } from "@/lib/entry/route";
import { getFinding } from "@/lib/findings/queries";

export const GET = route<{ moveId: string; findingId: string }>((viewer, { moveId, findingId }) => getFinding(viewer, moveId, findingId));
