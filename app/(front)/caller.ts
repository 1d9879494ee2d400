import "server-only";
import { headers } from "next/headers";
import type { Caller } from "@/lib/account/commands/sign-in";
import { callerAddress } from "@/lib/entry/address";

/** Where the form that is being handled was sent from. */
export async function caller(): Promise<Caller> {
  return { address: await callerAddress(), headers: await headers() };
}
