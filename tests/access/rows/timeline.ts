import { getTimeline } from "@/lib/timeline/queries";
import { query } from "../build";
import { SEATED } from "../personas";

export const timelineRows = [query({ name: "getTimeline", right: SEATED, run: (viewer, { moveId }) => getTimeline(viewer, moveId, 1000) })];
