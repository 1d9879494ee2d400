import { verifyRecord } from "@/lib/record/queries";
import { getFacts } from "@/lib/standing/queries";
import { query } from "../build";
import { SEATED } from "../personas";

export const recordRows = [query({ name: "verifyRecord", right: SEATED, run: (viewer, { moveId }) => verifyRecord(viewer, moveId) })];

export const standingRows = [query({ name: "getFacts", right: SEATED, run: (viewer, { moveId }) => getFacts(viewer, moveId) })];
