import { command } from "@/lib/entry/command";
import { giveInstruction } from "@/lib/movement/commands";
import { giveInstructionInput } from "@/lib/movement/input";

export const POST = command(giveInstructionInput, giveInstruction);
