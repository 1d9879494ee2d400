import { z } from "zod";
import { idOf } from "@/lib/access/input";

export const mergeCompaniesInput = z.strictObject({ keepId: idOf, goneId: idOf }).refine(({ keepId, goneId }) => keepId !== goneId, { path: ["goneId"], error: "Choose two different companies." });
export type MergeCompanies = z.output<typeof mergeCompaniesInput>;

export const personInput = z.strictObject({ userId: idOf });
export type OnePerson = z.output<typeof personInput>;

export const retryMailInput = z.strictObject({ outboxId: idOf });
export type RetryMail = z.output<typeof retryMailInput>;
