"use server";

import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { auth } from "@/lib/auth";
import { requireOurOrigin } from "@/lib/entry/command";
import { routes } from "@/lib/routes";
import { safeNext } from "@/lib/viewer/next-path";

/** Signs out and comes back to a page of ours that needs somebody else. */
export async function signOutTo(path: string): Promise<void> {
  const sent = await headers();
  requireOurOrigin(sent);
  await auth().api.signOut({ headers: sent });
  redirect(safeNext(path) ?? routes.signIn());
}
