"use server";

import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { auth } from "@/lib/auth";
import { requireOurOrigin } from "@/lib/entry/command";
import { routes } from "@/lib/routes";

/** Ends this session on the server and in the browser; works without script. */
export async function signOut(): Promise<void> {
  const sent = await headers();
  requireOurOrigin(sent);
  await auth().api.signOut({ headers: sent });
  redirect(routes.signIn());
}
