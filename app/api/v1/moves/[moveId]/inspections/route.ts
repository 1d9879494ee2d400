import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { recordVisit } from "@/lib/inspections/commands";
import { recordVisitInput } from "@/lib/inspections/input";
import { listInspections } from "@/lib/inspections/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => listInspections(viewer, moveId));
export const POST = command(recordVisitInput, recordVisit);
