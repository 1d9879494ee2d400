"use server";

import { redirect } from "next/navigation";
import { after } from "next/server";
import { unsafeCountMail, unsafeMailReset } from "@/lib/account/commands/sign-in";
import { mailMeInput } from "@/lib/account/input";
import { handleForm, type FormState } from "@/lib/entry/form";
import { routes } from "@/lib/routes";
import { caller } from "@/app/(front)/caller";

export async function mailReset(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(mailMeInput, data, async (input) => {
    await unsafeCountMail(input.email, await caller());
    after(() => unsafeMailReset(input));
    redirect(routes.checkMail("reset"));
  });
}
