import "server-only";
import { headers } from "next/headers";
import { cache } from "react";
import { auth } from "@/lib/auth";
import { AppError } from "@/lib/errors";
import { unsafeViewerOf } from "./queries";
import type { Viewer } from "./types";

/** Who is asking, read from the database once per request; null when signed out. */
export const getViewer = cache(async (): Promise<Viewer | null> => {
  const found = await auth().api.getSession({ headers: await headers() });
  return found ? unsafeViewerOf(found.user.id, found.session.id) : null;
});

/** The same, refusing when signed out or when the address has not been checked. */
export async function requireViewer(): Promise<Viewer> {
  const viewer = await getViewer();
  if (!viewer) throw new AppError("signed_out", "Sign in to continue.");
  if (!viewer.emailVerified) throw new AppError("address_unchecked", "Open the link that we mailed to you first, so that we know the address is yours.");
  return viewer;
}
