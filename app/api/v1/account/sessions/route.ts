import { endOtherSessions } from "@/lib/account/commands/own";
import { nothingInput } from "@/lib/account/input";
import { command } from "@/lib/entry/command";

export const DELETE = command(nothingInput, endOtherSessions);
