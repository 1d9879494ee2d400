import { command } from "@/lib/entry/command";
import { revokeLetter } from "@/lib/parties/commands/invite";
import { invitationInput } from "@/lib/parties/input";

export const DELETE = command(invitationInput, revokeLetter);
