import { listMail } from "@/lib/admin/queries";
import { mailStateOf } from "@/lib/admin/search";
import { route } from "@/lib/entry/route";

export const GET = route((viewer, _params, request) => listMail(viewer, mailStateOf(Object.fromEntries(new URL(request.url).searchParams))));
