import "server-only";
import { headers } from "next/headers";
import { notFound, redirect } from "next/navigation";
import { AppError } from "@/lib/errors";
import { routes } from "@/lib/routes";
import type { Viewer } from "@/lib/viewer/types";
import { requireViewer } from "@/lib/viewer/viewer";

/** For pages: a refusal becomes the page a person expects to see. */
export async function load<T>(run: (viewer: Viewer) => Promise<T>): Promise<T> {
  try {
    return await run(await requireViewer());
  } catch (error) {
    if (error instanceof AppError && (error.code === "not_found" || error.code === "not_your_part")) notFound();
    if (error instanceof AppError && error.code === "signed_out") redirect(routes.signIn((await headers()).get("x-path") ?? undefined));
    if (error instanceof AppError && error.code === "address_unchecked") redirect(routes.checkMail());
    throw error;
  }
}
