"use server";

import { redirect } from "next/navigation";
import { unsafeEnter } from "@/lib/account/commands/sign-in";
import { tokenInput } from "@/lib/account/input";
import { handleForm, type FormState } from "@/lib/entry/form";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";
import { caller } from "@/app/(front)/caller";

export async function enter(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(tokenInput, data, async ({ token }) => {
    await unsafeEnter(token, await caller(), (await getViewer())?.sessionId ?? null);
    redirect(routes.moves());
  });
}
