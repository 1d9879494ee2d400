import { command } from "@/lib/entry/command";
import { editLeg } from "@/lib/moves/commands";
import { editLegInput } from "@/lib/moves/input";

export const PUT = command(editLegInput, editLeg);
