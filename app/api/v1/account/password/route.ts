import { headers } from "next/headers";
import { changePassword } from "@/lib/account/commands/own";
import { changePasswordInput } from "@/lib/account/input";
import { command } from "@/lib/entry/command";

export const POST = command(changePasswordInput, async (viewer, input, attempt) => changePassword(viewer, input, attempt, await headers()));
