import { command } from "@/lib/entry/command";
import { inviteParty } from "@/lib/parties/commands/invite";
import { invitePartyInput } from "@/lib/parties/input";

export const POST = command(invitePartyInput, inviteParty);
