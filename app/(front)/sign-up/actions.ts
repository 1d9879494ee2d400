"use server";

import { redirect } from "next/navigation";
import { unsafeSignUp } from "@/lib/account/commands/sign-in";
import { signUpInput } from "@/lib/account/input";
import { handleForm, type FormState } from "@/lib/entry/form";
import { routes } from "@/lib/routes";
import { caller } from "@/app/(front)/caller";

export async function signUp(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(signUpInput, data, async (input) => {
    await unsafeSignUp(input, await caller());
    redirect(routes.checkMail("sign-up"));
  });
}
