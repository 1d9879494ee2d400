import { command } from "@/lib/entry/command";
import { answerFinding } from "@/lib/findings/commands";
import { answerFindingInput } from "@/lib/findings/input";

export const POST = command(answerFindingInput, answerFinding);
