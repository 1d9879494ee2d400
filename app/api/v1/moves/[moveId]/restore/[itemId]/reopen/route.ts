import { command } from "@/lib/entry/command";
import { reopenRestore } from "@/lib/prep/commands";
import { reopenItemInput } from "@/lib/prep/input";

export const POST = command(reopenItemInput, reopenRestore);
