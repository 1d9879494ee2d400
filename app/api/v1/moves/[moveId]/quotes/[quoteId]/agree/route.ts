import { command } from "@/lib/entry/command";
import { agreeQuote } from "@/lib/fees/commands/quotes";
import { quoteInput } from "@/lib/fees/input";

export const POST = command(quoteInput, agreeQuote);
