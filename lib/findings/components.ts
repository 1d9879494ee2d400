import type { PlaceKind } from "./places";

/**
 * Groups with the letter that the trade gives to a bad-order reason: ASC X12 element 1488, the letters that a locomotive
 * needs. What stands under "mechanical" has no letter of its own there and goes by J, mechanical inspection.
 */
export const COMPONENT_GROUPS = [
  { id: "brakes", label: "Brakes", letter: "B" },
  { id: "draft", label: "Couplers and draft gear", letter: "F" },
  { id: "safety-appliances", label: "Safety appliances", letter: "L" },
  { id: "trucks", label: "Trucks", letter: "M" },
  { id: "underframe", label: "Underframe", letter: "N" },
  { id: "wheels", label: "Wheels, axles and bearings", letter: "O" },
  { id: "damage", label: "Derailment or accident damage", letter: "D" },
  { id: "mechanical", label: "Engine, electrical, body and papers", letter: "J" },
] as const;
export type ComponentGroup = (typeof COMPONENT_GROUPS)[number]["id"];
export type ReasonLetter = (typeof COMPONENT_GROUPS)[number]["letter"];

/** What a finding is about. The ids are ours and never change; the letter follows from the group. */
export type Component = {
  id: string;
  group: ComponentGroup;
  label: string;
  letter: ReasonLetter;
  /** Sorts of places where it is found, the usual one first; empty where it concerns the whole unit. */
  places: readonly PlaceKind[];
};

type Row = readonly [id: string, label: string, ...places: PlaceKind[]];

const ROWS: Record<ComponentGroup, readonly Row[]> = {
  brakes: [
    ["brake-shoe", "Brake shoe", "wheel"],
    ["brake-head", "Brake head or hanger", "wheel"],
    ["piston-travel", "Piston travel", "truck", "wheel"],
    ["brake-cylinder", "Brake cylinder", "truck", "wheel"],
    ["slack-adjuster", "Slack adjuster", "truck", "wheel"],
    ["brake-rigging", "Levers, rods and pins of the rigging", "truck", "wheel"],
    ["hand-brake", "Hand brake", "end", "side", "cab"],
    ["hand-brake-chain", "Hand-brake chain and bell crank", "truck", "underframe"],
    ["brake-pipe", "Brake pipe", "underframe", "end"],
    ["brake-pipe-hose", "Brake-pipe hose", "end"],
    ["angle-cock", "Angle cock", "end"],
    ["mu-air-hose", "Multiple-unit air hose", "end"],
    ["truck-cut-out", "Truck cut-out cock", "truck"],
    ["brake-set-up", "Set-up to be hauled dead", "cab", "underframe"],
    ["main-reservoir", "Main reservoir", "tank"],
    ["air-leak", "Air leak", "underframe", "truck", "end", "cab", "tank"],
    ["air-brake-date", "Date of the air-brake work", "side", "cab"],
    ["sander", "Sander", "wheel", "truck"],
  ],
  draft: [
    ["coupler-height", "Coupler height", "coupler"],
    ["coupler-head", "Coupler head", "coupler"],
    ["knuckle", "Knuckle", "coupler"],
    ["coupler-lock", "Lock and lock lifter", "coupler"],
    ["carrier-iron", "Carrier iron", "coupler"],
    ["alignment-control", "Alignment control", "coupler"],
    ["stop-block", "Stop block", "coupler"],
    ["draft-gear", "Draft gear", "coupler"],
    ["yoke", "Yoke or drawbar pin", "coupler"],
  ],
  "safety-appliances": [
    ["uncoupling-lever", "Uncoupling lever", "coupler", "end"],
    ["handhold", "Handhold or grab iron", "end", "side", "cab"],
    ["handrail", "Handrail", "side", "end"],
    ["step", "Step", "end", "side", "cab"],
    ["ladder", "Ladder", "side", "end", "cab"],
    ["walkway", "Walkway or running board", "side", "end", "roof"],
    ["end-chain", "End chain or drop step", "end"],
  ],
  trucks: [
    ["truck-frame", "Truck frame", "truck"],
    ["bolster", "Bolster", "truck"],
    ["spring", "Spring or equalizer", "truck", "wheel"],
    ["snubber", "Snubber or shock absorber", "truck", "wheel"],
    ["side-bearing", "Side bearing", "truck"],
    ["center-plate", "Center plate", "truck"],
    ["pedestal", "Pedestal or its liner", "wheel", "truck"],
    ["truck-securing", "Device that holds truck and body together", "truck"],
    ["lifting-clip", "Shop lifting or locking clip", "truck"],
  ],
  underframe: [
    ["sill", "Center or side sill", "underframe", "side"],
    ["pilot", "Pilot or snow plow", "end"],
    ["fuel-tank", "Fuel tank", "tank"],
    ["tank-hanger", "Tank hanger or strap", "tank"],
    ["low-part", "Part hanging low", "underframe", "truck", "end"],
  ],
  wheels: [
    ["flange-height", "Flange height", "wheel"],
    ["flange-thickness", "Flange thickness", "wheel"],
    ["rim", "Rim thickness", "wheel"],
    ["tread", "Tread wear", "wheel"],
    ["flat-spot", "Flat spot", "wheel"],
    ["shelling", "Shelling", "wheel"],
    ["wheel-crack", "Crack, or burnt tread or plate", "wheel"],
    ["wheel-mate", "Difference between wheels", "axle", "truck"],
    ["axle", "Axle", "axle"],
    ["journal-bearing", "Journal bearing", "wheel"],
    ["bearing-cap", "Bearing end cap", "wheel"],
    ["plain-bearing", "Plain bearing: oil, wedge, packing, lid", "wheel"],
    ["hot-box", "Hot bearing", "wheel"],
    ["suspension-bearing", "Motor suspension bearing", "axle"],
  ],
  damage: [
    ["derailment", "Derailment", "truck", "wheel"],
    ["collision", "Collision or sideswipe", "side", "end", "cab"],
    ["theft", "Theft or vandalism", "cab", "side", "roof", "end"],
  ],
  mechanical: [
    ["gear-case", "Gear case", "axle"],
    ["traction-motor", "Traction motor", "axle"],
    ["battery", "Battery or battery switch", "side", "cab"],
    ["starting-secured", "Secured against starting", "cab"],
    ["jumper-cable", "Jumper cable or receptacle", "end"],
    ["stack-cap", "Exhaust stack or its cap", "roof"],
    ["roof-hatch", "Roof hatch, fan or guard", "roof"],
    ["hood-door", "Hood door", "side"],
    ["cab-door", "Cab door or lock", "cab"],
    ["glazing", "Window", "cab", "side", "end"],
    ["loose-part", "Loose part", "side", "end", "roof", "cab"],
    ["fuel-leak", "Fuel leak", "tank", "underframe", "side"],
    ["oil-leak", "Oil leak", "underframe", "side", "truck"],
    ["water", "Cooling water and drains", "side", "underframe"],
    ["marking", "Mark, number or stencil", "side", "end"],
    ["aei-tag", "AEI tag", "side"],
    ["blue-card", "Blue card", "cab"],
    ["tag", "Tag or tow card", "cab", "side"],
    ["register", "Register entry"],
    ["clearance", "Outline or weight"],
    ["other", "Something else", "underframe", "side", "end", "cab", "roof", "truck", "wheel", "axle", "coupler", "tank"],
  ],
};

/** Every component that a finding can name, group by group. */
export const COMPONENTS: readonly Component[] = COMPONENT_GROUPS.flatMap(({ id: group, letter }) =>
  ROWS[group].map(([id, label, ...places]) => ({ id, group, label, letter, places })),
);

const BY_ID = new Map(COMPONENTS.map((component) => [component.id, component]));

/** The component of an id; null for one that an older case still holds. */
export function findComponent(id: string): Component | null {
  return BY_ID.get(id) ?? null;
}
