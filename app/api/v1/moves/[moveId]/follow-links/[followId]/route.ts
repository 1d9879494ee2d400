import { command } from "@/lib/entry/command";
import { endFollowLink } from "@/lib/parties/commands/follow";
import { endFollowLinkInput } from "@/lib/parties/input";

export const DELETE = command(endFollowLinkInput, endFollowLink);
