import { command } from "@/lib/entry/command";
import { keepItem } from "@/lib/prep/commands";
import { keepItemInput } from "@/lib/prep/input";

export const POST = command(keepItemInput, keepItem);
