import { command } from "@/lib/entry/command";
import { signPhase } from "@/lib/prep/commands";
import { signPhaseInput } from "@/lib/prep/input";

export const POST = command(signPhaseInput, signPhase);
