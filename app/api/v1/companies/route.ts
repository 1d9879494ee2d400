import { makeCompany } from "@/lib/companies/commands/company";
import { makeCompanyInput } from "@/lib/companies/input";
import { listCompanies } from "@/lib/companies/queries";
import { command } from "@/lib/entry/command";
import { route } from "@/lib/entry/route";

export const GET = route((viewer) => listCompanies(viewer));
export const POST = command(makeCompanyInput, makeCompany);
