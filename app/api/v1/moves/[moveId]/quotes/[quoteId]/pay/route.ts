import { command } from "@/lib/entry/command";
import { payQuote } from "@/lib/fees/commands/pay";
import { quoteInput } from "@/lib/fees/input";

export const POST = command(quoteInput, payQuote);
