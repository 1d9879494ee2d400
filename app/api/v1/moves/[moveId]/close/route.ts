import { command } from "@/lib/entry/command";
import { closeMove } from "@/lib/movement/commands";
import { closeMoveInput } from "@/lib/movement/input";

export const POST = command(closeMoveInput, closeMove);
