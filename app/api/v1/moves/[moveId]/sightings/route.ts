import { command } from "@/lib/entry/command";
import { makeSighting } from "@/lib/movement/commands";
import { makeSightingInput } from "@/lib/movement/input";

export const POST = command(makeSightingInput, makeSighting);
