import { companyLetterInput } from "@/lib/companies/input";
import { command } from "@/lib/entry/command";
import { revokeColleagueLetter } from "@/lib/parties/commands/colleague";

export const DELETE = command(companyLetterInput, revokeColleagueLetter);
