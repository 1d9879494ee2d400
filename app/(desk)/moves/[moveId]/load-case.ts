import "server-only";
import { cache } from "react";
import { load } from "@/lib/entry/load";
import { getCaseFile } from "@/lib/moves/queries";

/** The case for the pages of one request: title, head and first page read it once. */
export const loadCase = cache((moveId: string) => load((viewer) => getCaseFile(viewer, moveId)));
