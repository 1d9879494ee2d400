import { route } from "@/lib/entry/route";
import { getTimeline } from "@/lib/timeline/queries";
import { showOf } from "@/lib/timeline/show";

export const GET = route<{ moveId: string }>((viewer, { moveId }, request) => getTimeline(viewer, moveId, showOf(new URL(request.url).searchParams.get("show"))));
