import { endSession } from "@/lib/account/commands/own";
import { endSessionInput } from "@/lib/account/input";
import { command } from "@/lib/entry/command";

export const DELETE = command(endSessionInput, endSession);
