import { companyLetterInput } from "@/lib/companies/input";
import { command } from "@/lib/entry/command";
import { sendColleagueLetterAgain } from "@/lib/parties/commands/colleague";

export const POST = command(companyLetterInput, sendColleagueLetterAgain);
