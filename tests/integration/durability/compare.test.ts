import { expect, it } from "vitest";
import { writeOnMove } from "@/lib/standing/commands";
import { withDatabase } from "../../support/database";
import { anAttempt, seedMove } from "../../support/factories";
import { aStep, compare, takeHere, takeSurely } from "./writers";

const database = withDatabase();

it("the comparison that the killing tests rest on sees what is lost, half there, doubled or broken", async () => {
  const move = await seedMove();
  const clean = { lost: 0, half: 0, doubled: 0, brokenChains: 0 };
  const taken = await takeSurely(aStep(move.moveId, 0, 1), takeHere(move.owner));
  expect(await compare([move], [taken])).toEqual({ acknowledged: 1, resolved: 0, ...clean });
  expect(await compare([move], [taken, { ...aStep(move.moveId, 0, 2), tries: 1 }])).toMatchObject({ ...clean, lost: 1 });

  // Tried again under another key, as a client without keys would.
  await takeHere(move.owner)({ ...taken, key: crypto.randomUUID() });
  expect(await compare([move], [taken])).toMatchObject({ ...clean, doubled: 1 });
  await writeOnMove(move.owner, anAttempt(), move.moveId, (ctx) => ctx.append({ kind: "move.changed", detail: { mark: "0:3" } }));
  expect(await compare([move], [taken])).toMatchObject({ ...clean, doubled: 1, half: 1 });

  const root = await database.root();
  await root.query("update record set by_name = 'Somebody else' where move_id = ? and seq = 1", [move.moveId]);
  await root.end();
  expect(await compare([move], [taken])).toMatchObject({ brokenChains: 1 });
});
