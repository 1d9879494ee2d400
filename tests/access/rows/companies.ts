import { editCompany, makeCompany } from "@/lib/companies/commands/company";
import { admitMember, changeMember, removeMember } from "@/lib/companies/commands/members";
import { getCompany, listCompanies } from "@/lib/companies/queries";
import { anAttempt } from "../../support/factories";
import { EVERYBODY, query, step } from "../build";
import { seatedBut } from "../personas";

/** Carrier A's company: its desk manages it, its inspector and its clerk belong to it, and its guest has not been admitted. */
const MEMBERS = ["inspectorA", "clerkA", "deskA"] as const;
const managed = { right: ["deskA"], hidden: seatedBut(...MEMBERS) } as const;
const works = { inspects: true, bills: false, dispatches: false };
const noSeed = async () => ({});

export const companyRows = [
  query({ name: "listCompanies", right: [...MEMBERS, "guest"], open: true, own: true, needle: ({ carrierId }) => carrierId, run: (viewer) => listCompanies(viewer) }),
  query({
    name: "getCompany", right: MEMBERS, hidden: seatedBut(...MEMBERS), shows: { what: /address of (?:inspectorA|clerkA|deskA|guest)$/, to: ["deskA"] },
    run: (viewer, { carrierId }) => getCompany(viewer, carrierId),
  }),
  step({ name: "makeCompany", right: EVERYBODY, own: true, named: false, seed: noSeed, run: (viewer) => makeCompany(viewer, { name: "New Works", mark: null, phone: null }, anAttempt()) }),
  step({ name: "editCompany", fresh: true, ...managed, seed: noSeed, run: (viewer, { carrierId }) => editCompany(viewer, { companyId: carrierId, version: 1, name: "Quillan & Sandbar", mark: "ZQSR", phone: null }, anAttempt()) }),
  step({
    name: "admitMember", fresh: true, ...managed, seed: async (of) => ({ userId: of.people.guest.userId }),
    run: (viewer, { carrierId, userId }) => admitMember(viewer, { companyId: carrierId, userId, ...works }, anAttempt()),
  }),
  step({
    name: "changeMember", fresh: true, ...managed, seed: async (of) => ({ userId: of.people.inspectorA.userId }),
    run: (viewer, { carrierId, userId }) => changeMember(viewer, { companyId: carrierId, userId, manager: true, ...works }, anAttempt()),
  }),
  step({
    name: "removeMember", as: "another or oneself", fresh: true, ...managed, right: ["deskA", "inspectorA"], seed: async (of) => ({ userId: of.people.inspectorA.userId }),
    run: (viewer, { carrierId, userId }) => removeMember(viewer, { companyId: carrierId, userId }, anAttempt()),
  }),
];
