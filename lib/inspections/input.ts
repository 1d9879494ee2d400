import { z } from "zod";
import { dayOf, enteredForOrNull, idOf, line, lineOrNull, linesOrNull, zoneOf } from "@/lib/access/input";
import { lacksSource, NO_SOURCE_WORDS } from "./rules";
import { AIR_STATES } from "./vocabulary";

/** As a gauge shows it, or as a form sends it; empty is not said. */
const psiOrNull = z
  .union([z.null(), z.literal("").transform(() => null), z.coerce.number({ error: "Enter whole psi, such as 90." }).int("Enter whole psi, such as 90.").min(0, "Not below 0 psi.").max(300, "At most 300 psi.")])
  .optional()
  .transform((psi) => psi ?? null);

export const recordVisitInput = z
  .strictObject({
    moveId: idOf,
    legId: idOf,
    visitedOn: dayOf("Say on which day the inspector was at the unit."),
    place: line("Say where the unit was looked at."),
    zone: zoneOf,
    inspectorName: line("Say who looked at the unit."),
    air: z.enum(AIR_STATES, { error: "Say whether air was on the unit." }),
    airSource: lineOrNull(),
    airPsi: psiOrNull,
    note: linesOrNull(),
    enteredFor: enteredForOrNull,
  })
  .refine((given) => !lacksSource(given), { path: ["airSource"], error: NO_SOURCE_WORDS, when: () => true });
export type RecordVisit = z.output<typeof recordVisitInput>;
