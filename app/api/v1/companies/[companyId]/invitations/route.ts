import { inviteColleagueInput } from "@/lib/companies/input";
import { command } from "@/lib/entry/command";
import { inviteColleague } from "@/lib/parties/commands/colleague";

export const POST = command(inviteColleagueInput, inviteColleague);
