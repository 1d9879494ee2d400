import { BRAKE_SCHEDULES, TRACTION_MOTORS } from "@/lib/moves/vocabulary";
import type { PrepFacts } from "./template/types";

/** The unit as the case file keeps it; answers by key of lib/moves/catalogue. */
type KnownUnit = { brakeSchedule: string; bearings: string; facts: Readonly<Record<string, string>> };

const yesNo = (answer: string | undefined) => (answer === "yes" ? true : answer === "no" ? false : null);
const oneOf = <T extends string>(list: readonly T[], value: string | undefined): T | null => list.find((one) => one === value) ?? null;

/** What the checklist may rely on; an answer nobody gave stays unknown and leaves nothing out. */
export function prepFactsOf({ brakeSchedule, bearings, facts }: KnownUnit): PrepFacts {
  return {
    brakeSchedule: oneOf(BRAKE_SCHEDULES, brakeSchedule),
    plainBearings: bearings === "" ? null : bearings === "plain",
    headEndPower: yesNo(facts["head-end-power"]),
    muFitted: yesNo(facts["mu"]),
    motorsTraction: oneOf(TRACTION_MOTORS, facts["traction-motors"]),
    engineFitted: yesNo(facts["engine"]),
  };
}
