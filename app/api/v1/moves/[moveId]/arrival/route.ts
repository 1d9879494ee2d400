import { command } from "@/lib/entry/command";
import { recordArrival } from "@/lib/movement/commands";
import { recordArrivalInput } from "@/lib/movement/input";

export const POST = command(recordArrivalInput, recordArrival);
