import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { beginDraft } from "@/lib/moves/commands";
import { beginDraftInput } from "@/lib/moves/input";
import { listDrafts } from "@/lib/moves/queries";

export const GET = route((viewer) => listDrafts(viewer));
export const POST = command(beginDraftInput, beginDraft);
