import { command } from "@/lib/entry/command";
import { cancelMove } from "@/lib/moves/commands";
import { cancelMoveInput } from "@/lib/moves/input";

export const POST = command(cancelMoveInput, cancelMove);
