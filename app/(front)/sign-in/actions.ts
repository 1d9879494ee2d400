"use server";

import { redirect } from "next/navigation";
import { after } from "next/server";
import { unsafeCountMail, unsafeMailSignInLink, unsafeSignIn } from "@/lib/account/commands/sign-in";
import { mailMeInput, signInInput } from "@/lib/account/input";
import { handleForm, type FormState } from "@/lib/entry/form";
import { routes } from "@/lib/routes";
import { safeNext } from "@/lib/viewer/next-path";
import { getViewer } from "@/lib/viewer/viewer";
import { caller } from "@/app/(front)/caller";

export async function signIn(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(signInInput, data, async ({ email, password, next }) => {
    const outcome = await unsafeSignIn({ email, password }, await caller(), (await getViewer())?.sessionId ?? null);
    redirect(outcome === "check-mail" ? routes.checkMail() : (safeNext(next) ?? routes.moves()));
  });
}

export async function mailSignInLink(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(mailMeInput, data, async (input) => {
    const from = await caller();
    await unsafeCountMail(input.email, from);
    after(() => unsafeMailSignInLink(input, from));
    redirect(routes.checkMail("sign-in"));
  });
}
