import { listAllCompanies } from "@/lib/admin/queries";
import { companySearchOf } from "@/lib/admin/search";
import { route } from "@/lib/entry/route";

export const GET = route((viewer, _params, request) => listAllCompanies(viewer, companySearchOf(Object.fromEntries(new URL(request.url).searchParams))));
