/** Brake equipment as the trade names it; "electronic" stands for every computer-controlled set. */
export const BRAKE_SCHEDULES = ["26-L", "24-RL", "6-SL", "6-BL", "14-EL", "30-CDW", "electronic", "other"] as const;
export type BrakeSchedule = (typeof BRAKE_SCHEDULES)[number];

/** Journal bearings, told apart by what carriers accept: some insist on an end cap that turns with the axle. */
export const BEARINGS = ["roller-rotating-cap", "roller-fixed-cap", "plain"] as const;
export type Bearing = (typeof BEARINGS)[number];

/** How far the coupler is kept from swinging sideways when the unit is pushed. */
export const ALIGNMENT = ["alignment-control", "stop-blocks", "push-back", "none"] as const;
export type Alignment = (typeof ALIGNMENT)[number];

/** Outlines that the drawings and the place names on the unit know. */
export const BODY_SHAPES = ["hood", "cab", "end-cab-switcher"] as const;
export type BodyShape = (typeof BODY_SHAPES)[number];

/** What stands at the end marked F; left, right and the numbering of the axles start there. */
export const F_ENDS = ["short-hood", "long-hood", "cab-end", "hood-end"] as const;
export type FEnd = (typeof F_ENDS)[number];

/** Axles in all, on two trucks. */
export const AXLES = [4, 6] as const;
export type Axles = (typeof AXLES)[number];

/** "none" is a unit without electric motors on its axles. */
export const TRACTION_MOTORS = ["dc", "ac", "none"] as const;
export type TractionMotors = (typeof TRACTION_MOTORS)[number];
