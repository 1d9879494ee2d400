import { retryMail } from "@/lib/admin/commands/mail";
import { mergeCompanies } from "@/lib/admin/commands/merge";
import { disablePerson, enablePerson, endSessionsOf } from "@/lib/admin/commands/people";
import { listAllCompanies, listMail, listPeople, requireSiteAdmin } from "@/lib/admin/queries";
import { anAttempt, seedCompany, seedUser } from "../../support/factories";
import { query, step } from "../build";
import { SEATED } from "../personas";
import { mailFailed } from "../steps";

/** Administration is there for site administrators; to everybody else there is no such page. */
const admin = { right: ["siteAdmin"], hidden: SEATED, own: true } as const;
const somebody = async () => ({ userId: await seedUser() });

export const adminRows = [
  query({ name: "requireSiteAdmin", ...admin, named: false, run: async (viewer) => requireSiteAdmin(viewer) }),
  query({ name: "listAllCompanies", ...admin, named: false, run: (viewer) => listAllCompanies(viewer) }),
  query({ name: "listPeople", ...admin, named: false, shows: { what: /^the address of/, to: ["siteAdmin"] }, run: (viewer) => listPeople(viewer, "person") }),
  query({ name: "listMail", ...admin, named: false, shows: { what: /^the address of|^whom a letter/, to: ["siteAdmin"] }, run: (viewer) => listMail(viewer) }),
  step({ name: "retryMail", ...admin, seed: async () => ({ outboxId: await mailFailed() }), run: (viewer, { outboxId }) => retryMail(viewer, { outboxId }, anAttempt()) }),
  step({ name: "mergeCompanies", ...admin, seed: async () => ({ keepId: await seedCompany("Twice"), goneId: await seedCompany("Twice") }), run: (viewer, { keepId, goneId }) => mergeCompanies(viewer, { keepId, goneId }, anAttempt()) }),
  step({ name: "disablePerson", ...admin, seed: somebody, run: (viewer, { userId }) => disablePerson(viewer, { userId }, anAttempt()) }),
  step({ name: "enablePerson", ...admin, seed: somebody, run: (viewer, { userId }) => enablePerson(viewer, { userId }, anAttempt()) }),
  step({ name: "endSessionsOf", ...admin, seed: somebody, run: (viewer, { userId }) => endSessionsOf(viewer, { userId }, anAttempt()) }),
];
