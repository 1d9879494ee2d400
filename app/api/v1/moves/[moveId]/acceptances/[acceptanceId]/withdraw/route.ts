import { withdrawAcceptance } from "@/lib/acceptance/commands";
import { withdrawAcceptanceInput } from "@/lib/acceptance/input";
import { command } from "@/lib/entry/command";

export const POST = command(withdrawAcceptanceInput, withdrawAcceptance);
