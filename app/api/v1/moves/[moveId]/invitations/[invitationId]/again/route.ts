import { command } from "@/lib/entry/command";
import { sendLetterAgain } from "@/lib/parties/commands/invite";
import { invitationInput } from "@/lib/parties/input";

export const POST = command(invitationInput, sendLetterAgain);
