import { command } from "@/lib/entry/command";
import { skipItem } from "@/lib/prep/commands";
import { skipItemInput } from "@/lib/prep/input";

export const POST = command(skipItemInput, skipItem);
