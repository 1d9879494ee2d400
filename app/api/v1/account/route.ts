import { renameMyself } from "@/lib/account/commands/own";
import { renameInput } from "@/lib/account/input";
import { getAccount } from "@/lib/account/queries";
import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";

export const GET = route((viewer) => getAccount(viewer));
export const PUT = command(renameInput, renameMyself);
