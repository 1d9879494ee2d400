"use server";

import { redirect } from "next/navigation";
import { unsafeVerifyAddress } from "@/lib/account/commands/sign-in";
import { tokenInput } from "@/lib/account/input";
import { handleForm, type FormState } from "@/lib/entry/form";
import { routes } from "@/lib/routes";
import { caller } from "@/app/(front)/caller";

export async function verifyAddress(_state: FormState, data: FormData): Promise<FormState> {
  return handleForm(tokenInput, data, async ({ token }) => {
    redirect((await unsafeVerifyAddress(token, await caller())) ? routes.moves() : routes.signIn());
  });
}
