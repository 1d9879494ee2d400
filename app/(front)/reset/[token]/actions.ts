"use server";

import { redirect } from "next/navigation";
import { unsafeResetPassword } from "@/lib/account/commands/sign-in";
import { resetPasswordInput } from "@/lib/account/input";
import { handleForm, type FormState } from "@/lib/entry/form";
import { routes } from "@/lib/routes";
import { caller } from "@/app/(front)/caller";

export async function resetPassword(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(resetPasswordInput, data, async (input) => {
    await unsafeResetPassword(input, await caller());
    redirect(routes.signIn(undefined, "reset"));
  });
}
