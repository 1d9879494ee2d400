"use server";

import { redirect } from "next/navigation";
import { caller } from "@/app/(front)/caller";
import { handleForm, type FormState } from "@/lib/entry/form";
import { joinInput } from "@/lib/parties/input";
import { unsafeJoin, type Joined } from "@/lib/parties/commands/join";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";

const LANDINGS: Record<Joined["landing"], (moveId: string) => string> = {
  moves: routes.moves, case: routes.move, prep: routes.prep, findings: routes.findings, fees: routes.fees, movement: routes.movement,
};

export async function join(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(joinInput, data, async (input) => {
    const { landing, moveId } = await unsafeJoin(input, await caller(), await getViewer());
    redirect(moveId ? LANDINGS[landing](moveId) : routes.moves());
  });
}
