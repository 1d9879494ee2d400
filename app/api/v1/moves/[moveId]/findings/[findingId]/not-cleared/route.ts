import { command } from "@/lib/entry/command";
import { notClearFinding } from "@/lib/findings/commands";
import { notClearedInput } from "@/lib/findings/input";

export const POST = command(notClearedInput, notClearFinding);
