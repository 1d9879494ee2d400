import type { Alignment, Axles, Bearing, BodyShape, BrakeSchedule, FEnd, TractionMotors } from "./vocabulary";

/** Brake equipment as shown on screen. */
export const BRAKE_SCHEDULE_LABELS: Record<BrakeSchedule, string> = {
  "26-L": "26-L",
  "24-RL": "24-RL",
  "6-SL": "6-SL",
  "6-BL": "6-BL",
  "14-EL": "14-EL",
  "30-CDW": "30-CDW",
  electronic: "Electronic",
  other: "Other",
};

/** Journal bearings as shown on screen. */
export const BEARING_LABELS: Record<Bearing, string> = {
  "roller-rotating-cap": "Roller, sealed, end cap turns with the axle",
  "roller-fixed-cap": "Roller, end cap does not turn (oil or grease)",
  plain: "Plain",
};

/** Coupler alignment as shown on screen. */
export const ALIGNMENT_LABELS: Record<Alignment, string> = {
  "alignment-control": "Alignment control (winged shank and matching draft gear)",
  "stop-blocks": "Stop blocks at the pocket sides",
  "push-back": "Push-back or shear-back coupler",
  none: "No alignment control",
};

/** Body outlines as shown on screen. */
export const BODY_SHAPE_LABELS: Record<BodyShape, string> = {
  hood: "Hood unit",
  cab: "Cab unit",
  "end-cab-switcher": "End-cab switcher",
};

/** The end marked F, as shown on screen. */
export const F_END_LABELS: Record<FEnd, string> = {
  "short-hood": "Short hood",
  "long-hood": "Long hood",
  "cab-end": "Cab end",
  "hood-end": "Hood end",
};

/** Number of axles as shown on screen. */
export const AXLE_LABELS: Record<Axles, string> = { 4: "Four axles", 6: "Six axles" };

/** Traction motors as shown on screen. */
export const TRACTION_MOTOR_LABELS: Record<TractionMotors, string> = {
  dc: "Direct current, with brushes",
  ac: "Alternating current, without brushes",
  none: "No traction motors",
};
