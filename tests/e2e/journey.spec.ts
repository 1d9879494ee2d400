import { test } from "@playwright/test";
import { acceptFirstLeg, acceptSecondLeg, acceptanceRefused, firstRound, secondRound, visitAndFind } from "./journey/inspecting";
import { agreeAndPay, agreeCredit, amountsHidden, paidOnce, quote } from "./journey/paying";
import { beginDraft, makeCompany, openMove } from "./journey/opening";
import { close, recordArrival, restore } from "./journey/arriving";
import { COMPANIES, everybody, gather, type Journey } from "./journey/cast";
import { follow, makeFollowLink, timeline, turnIs } from "./journey/watching";
import { instructFirst, instructSecond, pullRefused, release, sight } from "./journey/moving";
import { inviteAll, joinAll } from "./journey/inviting";
import { prepareWhenCoupled, prepareWhereItStands, reopenAndSignAgain } from "./journey/prep";
import { signUp } from "./support/arriving";
import { expectQuiet } from "./support/people";

/** One locomotive from its owner's first page to the receiver's last signature, by people at browsers of their own. */
test.describe.serial("A move from beginning to end", () => {
  test.setTimeout(240_000);
  let journey: Journey;
  let refusals: RegExp[] = [];

  test.beforeAll(async ({ browser }) => {
    journey = await gather(browser);
  });
  test.afterEach(() => {
    expectQuiet(everybody(journey), refusals);
    refusals = [];
  });
  test.afterAll(async () => {
    await Promise.all(everybody(journey).map(({ context }) => context.close()));
  });

  test("1. The owner signs up, makes a company, and opens a move from a draft that was left half way", async ({ request }) => {
    await test.step("signs up and proves the address", () => signUp(journey.people.owner, "four unrelated words here", request));
    await test.step("makes a company", () => makeCompany(journey));
    await test.step("begins a draft and leaves it", () => beginDraft(journey));
    await test.step("takes it up again and opens the move", () => openMove(journey));
  });

  test("2. Everybody is invited by mail, and lands where their work is with one button", async ({ request }) => {
    await test.step("the owner writes to each", () => inviteAll(journey));
    await test.step("each follows the letter", () => joinAll(journey, request));
  });

  test("3. The contractor works the prep list and signs it, also after a change", async () => {
    await test.step("prepares where the unit stands", () => prepareWhereItStands(journey));
    await test.step("opens an item again and signs anew", () => reopenAndSignAgain(journey));
  });

  test("4. A finding goes through two rounds, and the acceptance is refused meanwhile", async () => {
    refusals = [/status of 409/];
    await test.step("the inspector posts it on a phone", () => visitAndFind(journey));
    await test.step("5a. the acceptance is refused", () => acceptanceRefused(journey));
    await test.step("first answer, not cleared", () => firstRound(journey));
    await test.step("second answer, cleared", () => secondRound(journey));
  });

  test("5. The acceptance is signed with restrictions", () => acceptFirstLeg(journey));

  test("6. The first leg is quoted, agreed and paid once", async () => {
    await test.step("the clerk quotes", () => quote(journey));
    await test.step("the payer agrees and pays", () => agreeAndPay(journey));
    await test.step("paid once, with receipts", () => paidOnce(journey));
    await test.step("no amounts for others", () => amountsHidden(journey));
  });

  test("7a. Instruction, release and pickup", async () => {
    refusals = [/status of 409/];
    await test.step("pulling is refused before", () => pullRefused(journey));
    await test.step("the desk gives the instruction", () => instructFirst(journey));
    await test.step("the owner releases", () => release(journey));
    await test.step("the contractor does the second phase", () => prepareWhenCoupled(journey));
    const first = { by: "desk", carrier: COMPANIES.carrierA } as const;
    await test.step("pulled", () => sight(journey, { ...first, opener: "Record that it was pulled", kind: "Pulled" }));
    await test.step("departed", () => sight(journey, { ...first, opener: "Record a sighting", kind: "Departed", train: "QF14" }));
  });

  test("7b. The second carrier takes over with all earlier evidence in view", async () => {
    await test.step("inspects and accepts", () => acceptSecondLeg(journey));
    await test.step("agrees to credit", () => agreeCredit(journey));
    await test.step("gives its instruction", () => instructSecond(journey));
    await test.step("delivered at the interchange", () => sight(journey, { by: "desk", carrier: COMPANIES.carrierA, opener: "Record a sighting", kind: "Handed over" }));
    const second = { by: "second", carrier: COMPANIES.carrierB } as const;
    await test.step("received", () => sight(journey, { ...second, opener: "Record the receipt", kind: "Taken over" }));
    await test.step("at destination", () => sight(journey, { ...second, opener: "Record a sighting", kind: "Arrived at destination" }));
    await test.step("placed", () => sight(journey, { ...second, opener: "Record a sighting", kind: "Placed" }));
  });

  test("9a. Everybody sees whose turn it is, and who follows by a link sees no names and no money", async ({ browser }) => {
    await test.step("whose turn it is", () => turnIs(journey, "receiver", { task: "The unit is placed. Look it over and record how it arrived.", others: `The move waits on ${COMPANIES.receiver} to look it over.` }));
    await test.step("the owner makes a link", () => makeFollowLink(journey));
    await test.step("it is followed", () => follow(journey, browser, ["Pulled", "Placed"]));
  });

  test("8. The receiver records the arrival, the unit is put back, and the move is closed", async () => {
    await test.step("arrival", () => recordArrival(journey));
    await test.step("put back", () => restore(journey));
    await test.step("closed", () => close(journey));
  });

  test("9b. Everybody reads the timeline of the closed move", async ({ browser }) => {
    await test.step("timeline", () => timeline(journey));
    await test.step("followed after the end", () => follow(journey, browser, ["Placed"]));
  });
});
