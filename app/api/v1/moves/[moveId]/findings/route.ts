import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { postFinding } from "@/lib/findings/commands";
import { postFindingInput } from "@/lib/findings/input";
import { listFindings } from "@/lib/findings/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => listFindings(viewer, moveId));
export const POST = command(postFindingInput, postFinding);
