import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";
import { openMove } from "@/lib/moves/commands";
import { openMoveInput } from "@/lib/moves/input";
import { parseFilter } from "@/lib/moves/list-filter";
import { listMoves } from "@/lib/moves/queries";
import { fillPrep } from "@/lib/prep/commands";

export const GET = route((viewer, _params, request) => listMoves(viewer, parseFilter(Object.fromEntries(new URL(request.url).searchParams))));
export const POST = command(openMoveInput, (viewer, input, attempt) => openMove(viewer, input, attempt, fillPrep));
