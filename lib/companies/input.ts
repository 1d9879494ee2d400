import { z } from "zod";
import { emailOf, idOf, line, lineOrNull } from "@/lib/access/input";

// SCAC and reporting marks are two to four letters (AAR, from memory).
const mark = z
  .string()
  .transform((typed) => typed.trim().toUpperCase())
  .pipe(z.union([z.literal("").transform(() => null), z.string().regex(/^[A-Z]{2,4}$/, "Two to four letters.")]))
  .nullish()
  .transform((given) => given ?? null);

const facts = { name: line("Name the company."), mark, phone: lineOrNull(60) };

export const makeCompanyInput = z.strictObject(facts);
export type MakeCompany = z.output<typeof makeCompanyInput>;

export const editCompanyInput = z.strictObject({ companyId: idOf, version: z.int().min(1), ...facts });
export type EditCompany = z.output<typeof editCompanyInput>;

const works = { inspects: z.boolean().default(false), bills: z.boolean().default(false), dispatches: z.boolean().default(false) };

export const memberInput = z.strictObject({ companyId: idOf, userId: idOf });
export type OneMember = z.output<typeof memberInput>;

export const admitMemberInput = z.strictObject({ companyId: idOf, userId: idOf, ...works });
export type AdmitMember = z.output<typeof admitMemberInput>;

export const changeMemberInput = z.strictObject({ companyId: idOf, userId: idOf, manager: z.boolean(), ...works });
export type ChangeMember = z.output<typeof changeMemberInput>;

export const inviteColleagueInput = z.strictObject({ companyId: idOf, email: emailOf, name: lineOrNull(120), ...works });
export type InviteColleague = z.output<typeof inviteColleagueInput>;

export const companyLetterInput = z.strictObject({ companyId: idOf, invitationId: idOf });
export type CompanyLetter = z.output<typeof companyLetterInput>;
