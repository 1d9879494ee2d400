import "server-only";
import { headers } from "next/headers";
import { env } from "@/lib/env";

/** The caller's network address for limits. Only a header that the environment names counts; a client may write any other itself. */
export async function callerAddress(): Promise<string> {
  const name = env().TRUSTED_PROXY_HEADER;
  if (!name) return "direct";
  const value = (await headers()).get(name) ?? "";
  return value.split(",").at(-1)?.trim() || "unknown";
}
