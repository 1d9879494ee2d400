import { command } from "@/lib/entry/command";
import { makeFollowLink } from "@/lib/parties/commands/follow";
import { makeFollowLinkInput } from "@/lib/parties/input";

export const POST = command(makeFollowLinkInput, makeFollowLink);
