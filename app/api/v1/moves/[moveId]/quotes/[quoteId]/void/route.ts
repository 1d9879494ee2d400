import { command } from "@/lib/entry/command";
import { voidQuote } from "@/lib/fees/commands/quotes";
import { voidQuoteInput } from "@/lib/fees/input";

export const POST = command(voidQuoteInput, voidQuote);
