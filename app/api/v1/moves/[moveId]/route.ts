import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { editMove } from "@/lib/moves/commands";
import { editMoveInput } from "@/lib/moves/input";
import { getCaseFile } from "@/lib/moves/queries";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => getCaseFile(viewer, moveId));
export const PUT = command(editMoveInput, editMove);
