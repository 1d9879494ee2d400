import { YES_NO, type Requirement } from "./types";

const BODY_OF_UNIT = { group: "body", ofEquipment: true, column: null } as const;
const BODY_OF_MOVE = { group: "body", ofEquipment: false, column: null } as const;
const OF_MOVE = { group: "papers", ofEquipment: false, column: null } as const;

/** Body, safety appliances and the state in which an inspector finds the unit. */
export const BODY: readonly Requirement[] = [
  {
    ...BODY_OF_MOVE,
    key: "inoperable",
    question: "Is it shut down so that it cannot be started?",
    kind: "choice",
    choices: YES_NO,
    hint: "Inspectors want it so. It also means that brake items are seen without air unless air is brought.",
    evidence: "Photo of the open battery switch and the empty fuse clips",
  },
  {
    ...BODY_OF_UNIT,
    key: "legal",
    question: "Are safety appliances, running gear and air brakes as the federal rules ask?",
    kind: "choice",
    choices: YES_NO,
    hint: "A carrier wants this settled before an inspection is ordered. A qualified person says so, not this page.",
    evidence: "Own inspection before the carrier's",
  },
  {
    ...BODY_OF_UNIT,
    key: "glazing",
    question: "How are the windows?",
    kind: "choice",
    choices: [
      { value: "whole", label: "Whole" },
      { value: "boarded", label: "Boarded with painted plywood" },
      { value: "broken", label: "Broken" },
    ],
    hint: "Broken windows are repaired or boarded with painted plywood.",
    evidence: "Photo of each side",
  },
  {
    ...BODY_OF_UNIT,
    key: "reflectors",
    question: "Does it have reflective sheeting with a date?",
    kind: "choice",
    choices: YES_NO,
    hint: "One carrier asks it of private cars, with the date in the register; ask whether it is asked of locomotives.",
    evidence: "Photo of the sheeting",
  },
];

/** What is settled on paper before the unit moves. */
export const PAPERS: readonly Requirement[] = [
  {
    ...OF_MOVE,
    key: "access",
    question: "Where and how does an inspector get to it safely, and whom does he call?",
    kind: "text",
    hint: "If the inspecting carrier is not the one at the origin, the unit may have to stand at an interchange where people work.",
    evidence: "Contact and map",
  },
  { ...OF_MOVE, key: "authority", question: "Has the owner ordered the inspection in writing and named who pays for it?", kind: "choice", choices: YES_NO, hint: "Without it no inspector is sent.", evidence: "The letter" },
  {
    ...OF_MOVE,
    key: "credit",
    question: "How are the charges settled before it moves?",
    kind: "choice",
    choices: [
      { value: "credit", label: "Credit account" },
      { value: "prepaid", label: "All charges prepaid" },
      { value: "open", label: "Not settled yet" },
    ],
    hint: "Carriers ask for a credit account, for prepayment of all charges, or for both.",
    evidence: "Proof of the wire, or the credit approval",
  },
  { ...OF_MOVE, key: "insurance", question: "Until when does the insurance certificate run?", kind: "date", hint: "It has to cover the whole move; the holder of the mark, and carriers by contract, may want to be additional insured.", evidence: "The certificate" },
  { ...OF_MOVE, key: "payer-on-bill", question: "Who is named on the bill of lading as payer of each leg?", kind: "text", hint: "Where no payer is named the owner gets the bill.", evidence: "Bill of lading" },
  { ...OF_MOVE, key: "customer-id", question: "Under which customer number does each carrier know the payer?", kind: "text", hint: "Asked for on a carrier's own site.", evidence: null },
  {
    ...OF_MOVE,
    key: "rider",
    question: "Does somebody ride along or meet the train?",
    kind: "choice",
    choices: [
      { value: "none", label: "Nobody" },
      { value: "rides", label: "Somebody rides along" },
      { value: "meets", label: "Somebody meets the train" },
    ],
    hint: "Needed mainly for plain bearings and steam; from memory, ask the carrier.",
    evidence: null,
  },
  { ...OF_MOVE, key: "lead-time", question: "How many days of notice were given?", kind: "number", unit: "days", hint: "Enough to inspect and to mend what is found; a guide for heavy loads asks 14 days.", evidence: null },
];
