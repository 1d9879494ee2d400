import { retryMail } from "@/lib/admin/commands/mail";
import { retryMailInput } from "@/lib/admin/input";
import { command } from "@/lib/entry/command";

export const POST = command(retryMailInput, retryMail);
