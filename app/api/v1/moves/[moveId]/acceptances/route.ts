import { signAcceptance } from "@/lib/acceptance/commands";
import { signAcceptanceInput } from "@/lib/acceptance/input";
import { listAcceptances } from "@/lib/acceptance/queries";
import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";

export const GET = route<{ moveId: string }>((viewer, { moveId }) => listAcceptances(viewer, moveId));
export const POST = command(signAcceptanceInput, signAcceptance);
