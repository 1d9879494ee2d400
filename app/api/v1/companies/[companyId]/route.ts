import { editCompany } from "@/lib/companies/commands/company";
import { editCompanyInput } from "@/lib/companies/input";
import { getCompany } from "@/lib/companies/queries";
import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";

export const GET = route<{ companyId: string }>((viewer, { companyId }) => getCompany(viewer, companyId));
export const PUT = command(editCompanyInput, editCompany);
