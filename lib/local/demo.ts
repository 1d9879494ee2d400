import type { Db } from "@/db/client";
import { unsafeHoldMail } from "@/lib/outbox/commands";
import { demoClock } from "./demo/clock";
import { movingCase } from "./demo/moving";
import { absentCarrierCase, closedCase, openedCase } from "./demo/others";
import { makePeople } from "./demo/people";

/** Fills an empty database with the invented scenario, step by step through the same commands that people use. */
export async function loadDemo(db: Db, now = new Date()): Promise<void> {
  const clock = demoClock(now);
  const cast = await makePeople(db, clock.at(150));
  const stage = { db, clock, cast };
  await closedCase(stage);
  await movingCase(stage);
  await absentCarrierCase(stage);
  await openedCase(stage);
  await unsafeHoldMail(now);
}
