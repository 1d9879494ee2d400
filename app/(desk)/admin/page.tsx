import { redirect } from "next/navigation";
import { requireSiteAdmin } from "@/lib/admin/queries";
import { load } from "@/lib/entry/load";
import { routes } from "@/lib/routes";

export default async function AdminPage() {
  await load(async (viewer) => requireSiteAdmin(viewer));
  redirect(routes.adminCompanies());
}
