import { command } from "@/lib/entry/command";
import { removeParty } from "@/lib/parties/commands/remove";
import { removePartyInput } from "@/lib/parties/input";

export const DELETE = command(removePartyInput, removeParty);
