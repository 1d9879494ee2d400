import { command } from "@/lib/entry/command";
import { openMove } from "@/lib/moves/commands";
import { openMoveInput } from "@/lib/moves/input";
import { fillPrep } from "@/lib/prep/commands";

export const POST = command(openMoveInput, (viewer, input, attempt) => openMove(viewer, input, attempt, fillPrep));
