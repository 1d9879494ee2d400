import { mergeCompanies } from "@/lib/admin/commands/merge";
import { mergeCompaniesInput } from "@/lib/admin/input";
import { command } from "@/lib/entry/command";

export const POST = command(mergeCompaniesInput, mergeCompanies);
