import { command } from "@/lib/entry/command";
import { withdrawFinding } from "@/lib/findings/commands";
import { withdrawFindingInput } from "@/lib/findings/input";

export const POST = command(withdrawFindingInput, withdrawFinding);
