import { command } from "@/lib/entry/command";
import { giveQuote } from "@/lib/fees/commands/quotes";
import { giveQuoteInput } from "@/lib/fees/input";

export const POST = command(giveQuoteInput, giveQuote);
