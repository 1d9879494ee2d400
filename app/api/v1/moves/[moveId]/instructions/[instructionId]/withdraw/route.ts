import { command } from "@/lib/entry/command";
import { withdrawInstruction } from "@/lib/movement/commands";
import { withdrawInstructionInput } from "@/lib/movement/input";

export const POST = command(withdrawInstructionInput, withdrawInstruction);
