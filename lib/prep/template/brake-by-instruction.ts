import type { PrepPhase } from "../vocabulary";
import { proof } from "./proof";
import type { PrepTemplateItem } from "./types";

type Part = { id: string; subject: string; phase?: PrepPhase; order: number; appliesWhen?: PrepTemplateItem["appliesWhen"] };

/** Only the subject of each line is ours; names of parts in brackets are from memory. */
const PARTS: readonly Part[] = [
  { id: "A1", subject: "Engine, throttle and reverser", order: 110 },
  { id: "A2", subject: "Handles of the brake valves", order: 120 },
  { id: "A3", subject: "What takes the brake valve off the brake pipe (for instance a rotair valve on 24-RL, a double-heading cock on 6-SL, 6-BL or 14-EL)", order: 130 },
  { id: "A4", subject: "Multiple-unit valve, if there is one", order: 140, appliesWhen: [{ muFitted: true }] },
  { id: "A5", subject: "Main reservoirs and their drains", order: 150 },
  { id: "A6", subject: "Brake cylinders that stay applied, and truck cut-out cocks", order: 160 },
  { id: "A7", subject: "Dead-engine device (for instance a fixture with a cock, or a cut-in on the manifold of 30-CDW or electronic equipment)", order: 170 },
  { id: "A8", subject: "What limits brake-cylinder pressure", order: 180 },
  { id: "A9", subject: "Proof with air, coupled", phase: "when-coupled", order: 40 },
  { id: "A10", subject: "Breakers and switches of the brake", order: 190 },
];

/** Without a condition of their own, these lines stand in wherever no set-up for the equipment is written. */
function byInstruction({ id, subject, phase = "where-it-stands", order, appliesWhen = [] }: Part): PrepTemplateItem {
  return {
    id,
    group: "air-brakes",
    phase,
    order,
    action: `${subject}: per carrier's instruction. Write down what the instruction says and photograph the position as left.`,
    why: "Equipment differs by schedule and by unit; no published set-up was read for this one, so the carrier's tow instruction and the builder's manual decide.",
    caution:
      "Stored air and moving rigging: hand brake on, wheels chocked, everyone clear before a cock or handle is moved. Go by the stencil or tag, not by where a handle points. If there is no instruction, ask the carrier; do not guess.",
    evidence: proof("P", { label: "What the instruction says, who gave it, and the position as left" }),
    restore: {
      action: `${subject}: put back as the builder's manual says, from the position written down.`,
      caution: "Hand brake on and wheels chocked until the brake has been tested.",
    },
    source: "common practice",
    appliesWhen,
    when: "Units with other brake equipment than 26-L, or with equipment not known yet.",
  };
}

/** The ten brake lines for every schedule whose set-up we do not know from a published source. */
export const BRAKE_BY_INSTRUCTION: readonly PrepTemplateItem[] = PARTS.map(byInstruction);
