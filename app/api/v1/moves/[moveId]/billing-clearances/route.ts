import { command } from "@/lib/entry/command";
import { clearBilling } from "@/lib/fees/commands/quotes";
import { clearBillingInput } from "@/lib/fees/input";

export const POST = command(clearBillingInput, clearBilling);
