/** `anybody`; `link`: anybody, but only a good token in the address does something; `signed-in`; and those for whoever has a part in a case, a company or the site's administration: to others there is no such page. `behind` stands after the path when it is opened for something. */
export type PageRow = { page: string; who: "anybody" | "link" | "signed-in" | "case" | "company" | "draft" | "administration"; behind?: string };

const rows = (who: PageRow["who"], ...pages: string[]): PageRow[] => pages.map((page) => ({ page, who }));

/** Every page and who may open it. */
export const PAGES: readonly PageRow[] = [
  ...rows("anybody", "/", "/check-mail", "/forgot-password", "/sign-in", "/sign-in/link", "/sign-up"),
  ...rows("link", "/enter/[token]", "/follow/[token]", "/join/[token]", "/reset/[token]", "/verify/[token]"),
  ...rows("signed-in", "/moves", "/moves/new", "/account", "/account/companies", "/account/companies/new"),
  ...rows("draft", "/moves/new/[draftId]"),
  ...rows("company", "/account/companies/[companyId]"),
  ...rows("administration", "/admin", "/admin/companies", "/admin/mail", "/admin/people"),
  ...rows(
    "case",
    "/moves/[moveId]", "/moves/[moveId]/prep", "/moves/[moveId]/unit", "/moves/[moveId]/movement", "/moves/[moveId]/timeline", "/moves/[moveId]/people",
    "/moves/[moveId]/findings", "/moves/[moveId]/findings/[findingId]", "/moves/[moveId]/findings/visit", "/moves/[moveId]/findings/accept/[legId]",
    "/moves/[moveId]/fees", "/moves/[moveId]/fees/paid", "/moves/[moveId]/fees/quote/[legId]",
  ),
  { page: "/moves/[moveId]/findings/new", who: "case", behind: "?visit=[inspectionId]" },
];
