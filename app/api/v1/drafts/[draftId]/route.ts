import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { discardDraft, saveDraft } from "@/lib/moves/commands";
import { discardDraftInput, saveDraftInput } from "@/lib/moves/input";
import { getDraft } from "@/lib/moves/queries";

export const GET = route<{ draftId: string }>((viewer, { draftId }) => getDraft(viewer, draftId));
export const PUT = command(saveDraftInput, saveDraft);
export const DELETE = command(discardDraftInput, discardDraft);
