import { route } from "@/lib/entry/route";
import { getPeople } from "@/lib/parties/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getPeople(viewer, moveId));
