import { command } from "@/lib/entry/command";
import { reopenItem } from "@/lib/prep/commands";
import { reopenItemInput } from "@/lib/prep/input";

export const POST = command(reopenItemInput, reopenItem);
