import { enablePerson } from "@/lib/admin/commands/people";
import { personInput } from "@/lib/admin/input";
import { command } from "@/lib/entry/command";

export const POST = command(personInput, enablePerson);
