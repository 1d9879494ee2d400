import { command } from "@/lib/entry/command";
import { releaseUnit } from "@/lib/movement/commands";
import { releaseUnitInput } from "@/lib/movement/input";

export const POST = command(releaseUnitInput, releaseUnit);
