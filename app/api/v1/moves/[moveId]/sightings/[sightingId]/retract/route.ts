import { command } from "@/lib/entry/command";
import { retractSighting } from "@/lib/movement/commands";
import { retractSightingInput } from "@/lib/movement/input";

export const POST = command(retractSightingInput, retractSighting);
