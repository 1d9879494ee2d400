import { command } from "@/lib/entry/command";
import { restoreItem } from "@/lib/prep/commands";
import { restoreItemInput } from "@/lib/prep/input";

export const POST = command(restoreItemInput, restoreItem);
