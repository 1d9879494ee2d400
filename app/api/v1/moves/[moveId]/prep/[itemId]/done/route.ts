import { command } from "@/lib/entry/command";
import { finishItem } from "@/lib/prep/commands";
import { finishItemInput } from "@/lib/prep/input";

export const POST = command(finishItemInput, finishItem);
