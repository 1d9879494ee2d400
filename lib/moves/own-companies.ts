import type { Viewer } from "@/lib/viewer/types";

/** The companies for which the viewer can open a move. */
export const ownCompanies = (viewer: Viewer) => viewer.memberships.map(({ companyId, companyName }) => ({ companyId, companyName }));
