import { admitMember, changeMember, removeMember } from "@/lib/companies/commands/members";
import { admitMemberInput, changeMemberInput, memberInput } from "@/lib/companies/input";
import { command } from "@/lib/entry/command";

/** Admits a guest. */
export const POST = command(admitMemberInput, admitMember);
export const PUT = command(changeMemberInput, changeMember);
export const DELETE = command(memberInput, removeMember);
