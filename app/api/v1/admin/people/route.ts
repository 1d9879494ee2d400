import { listPeople } from "@/lib/admin/queries";
import { personSearchOf } from "@/lib/admin/search";
import { route } from "@/lib/entry/route";

export const GET = route((viewer, _params, request) => listPeople(viewer, personSearchOf(Object.fromEntries(new URL(request.url).searchParams))));
