import { type Part } from "@/lib/access/vocabulary";
import { routes } from "@/lib/routes";
import type { Wait } from "@/lib/standing/vocabulary";

type Waited = { legId: string | null; waitingFor: Wait; count: number | null };

type WaitWords = {
  /** What is waited for, after "to". */
  to: (count: number) => string;
  /** The same said to the one whose turn it is, as a whole sentence. */
  you: (count: number) => string;
  /** What the link to the right place says. */
  link: string;
};

const many = (n: number, one: string, more = `${one}s`) => `${n} ${n === 1 ? one : more}`;

/** Every reason for waiting, in words. */
export const WAIT_WORDS: Record<Wait, WaitWords> = {
  "invite-contractor": { to: () => "invite a contractor", you: () => "Invite the contractor who prepares the unit.", link: "Invite a contractor" },
  "name-payer": { to: () => "name who pays", you: () => "Say who pays the carrier of this leg.", link: "Name the payer" },
  "invite-payer": { to: () => "invite the payer", you: () => "Invite the company that pays, so that it can see and agree to the charges.", link: "Invite the payer" },
  "invite-carrier": { to: () => "invite the carrier", you: () => "Invite the carrier, or enter its steps for it.", link: "Invite the carrier" },
  "invite-receiver": { to: () => "invite a receiver", you: () => "Invite the company that receives the unit.", link: "Invite a receiver" },
  prepare: { to: (n) => `prepare, ${many(n, "item")} left`, you: (n) => `Prepare the unit where it stands: ${many(n, "item")} left.`, link: "Go to prep" },
  "sign-prep": { to: () => "sign the prep", you: () => "Everything is done where the unit stands. Look it over and sign it.", link: "Sign the prep" },
  inspect: { to: () => "inspect", you: () => "Inspect the unit and write down what you find.", link: "Enter a visit" },
  answer: { to: (n) => `answer ${many(n, "finding")}`, you: (n) => `Answer ${many(n, "finding")}: what was done, measured and photographed.`, link: "Go to findings" },
  "look-at-answers": { to: (n) => `look at ${many(n, "answer")}`, you: (n) => `Look at ${many(n, "answer")}: clear each finding, or say what would satisfy you.`, link: "Go to findings" },
  accept: { to: () => "sign acceptance", you: () => "No finding is open. Sign the acceptance, or write down what stands against it.", link: "Go to acceptance" },
  quote: { to: () => "quote the charges", you: () => "Quote the charges of this leg, or say that billing is cleared.", link: "Quote the charges" },
  agree: { to: () => "agree to the charges", you: () => "Look at the charges and agree to them.", link: "See the charges" },
  pay: { to: () => "pay", you: () => "Pay the charges that were agreed.", link: "Go to fees" },
  "confirm-payment": { to: () => "finish the payment", you: () => "A payment was begun and has not come through yet. Finish it, or wait for the payment service.", link: "Go to fees" },
  instruct: { to: () => "give the movement instruction", you: () => "Acceptance and billing stand. Give the movement instruction.", link: "Give the instruction" },
  release: { to: () => "release the unit", you: () => "The carrier has its instruction. Release the unit to it.", link: "Release the unit" },
  "prepare-coupled": { to: (n) => (n > 0 ? `do ${many(n, "item")} when coupled` : "sign the prep when coupled"), you: (n) => (n > 0 ? `When the carrier’s engine is coupled, do the last ${many(n, "item")} and sign.` : "Everything is done with the engine coupled. Sign it."), link: "Go to prep" },
  pull: { to: () => "pull the unit", you: () => "Everything stands. Record when the unit is pulled.", link: "Record it" },
  "move-on": { to: () => "move it on", you: () => "The unit is under way. Record where it is seen.", link: "Record a sighting" },
  "take-over": { to: () => "receive the unit", you: () => "The carrier before you has the unit at the interchange. Record when you receive it.", link: "Record the receipt" },
  place: { to: () => "place the unit", you: () => "The unit is at its destination. Record when it is placed.", link: "Record it" },
  arrival: { to: () => "look it over", you: () => "The unit is placed. Look it over and record how it arrived.", link: "Record the arrival" },
  restore: { to: (n) => `restore, ${many(n, "item")} left`, you: (n) => `Put back what was changed for the move: ${many(n, "item")} left.`, link: "Go to restoring" },
  close: { to: () => "close the move", you: () => "Everything is restored or kept as it is. Close the move.", link: "Close the move" },
};

const PART_OF_NAME: Partial<Record<Part, string>> = { inspector: "inspector", billing: "billing clerk", desk: "transport desk" };

/** Who is waited on: the company, and at a carrier the person who does that work. */
export function waitName({ part, name }: { part: Part; name: string }): string {
  const work = PART_OF_NAME[part];
  return work ? `${name}, ${work}` : name;
}

/** The lower line of a "waiting on" box: how long, for what. */
export function waitDetail({ waitingFor, count }: Pick<Waited, "waitingFor" | "count">, days: number): string {
  return `${days === 0 ? "since today" : days === 1 ? "1 day" : `${days} days`}, to ${WAIT_WORDS[waitingFor].to(count ?? 0)}`;
}

/** The whole state of waiting as one sentence, from the viewer's side. */
export function waitSentence(waiting: Waited & { part: Part; name: string; you: boolean }): string {
  const { waitingFor, you, part, name } = waiting;
  const count = waiting.count ?? 0;
  if (you) return WAIT_WORDS[waitingFor].you(count);
  const work = PART_OF_NAME[part];
  const who = name === "Contractor" || name === "Receiver" ? `the ${name.toLowerCase()}` : work ? `${name}’s ${work}` : name;
  return `The move waits on ${who} to ${WAIT_WORDS[waitingFor].to(count)}.`;
}

/** The page where what is waited for gets done. */
export function routeOfWait(moveId: string, { waitingFor, legId }: Pick<Waited, "waitingFor" | "legId">): string {
  switch (waitingFor) {
    case "invite-contractor": case "invite-carrier": case "invite-receiver": case "invite-payer":
      return routes.people(moveId);
    case "name-payer":
      return legId ? `${routes.unit(moveId)}#edit-${legId}` : routes.unit(moveId);
    case "prepare": case "sign-prep": case "prepare-coupled": case "restore":
      return routes.prep(moveId);
    case "inspect":
      return routes.visit(moveId);
    case "answer": case "look-at-answers":
      return routes.findings(moveId);
    case "accept":
      return legId ? routes.accept(moveId, legId) : routes.findings(moveId);
    case "quote":
      return legId ? routes.quote(moveId, legId) : routes.fees(moveId);
    case "agree": case "pay": case "confirm-payment":
      return routes.fees(moveId);
    case "instruct": case "release": case "pull": case "move-on": case "take-over": case "place": case "arrival": case "close":
      return routes.movement(moveId);
  }
}
