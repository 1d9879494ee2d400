import { batterySwitch, chain, chocks, handlesOff, overview, stackCap } from "./pictures";
import type { PrepNotes } from "./case";

/** Notes of the contractor on the six-axle unit; what is not named is done as found. */
export const ROAD_UNIT_NOTES: PrepNotes = {
  any: { photo: overview("unit-side.jpg", "The unit from the left") },
  P1: { photo: stackCap("stack-cap.jpg", "Plywood and steel caps on both stacks, strapped") },
  P4: { value: "180", photo: overview("fuel-gauge-side.jpg", "The fuel gauge side") },
  E1: { tag: "0418", photo: batterySwitch("battery-switch.jpg", "Battery switch open, tag 0418", "0418") },
  E3: { value: "Cab, left locker, bag 3" },
  A2: { photo: handlesOff("stand.jpg", "Control stand, both brake handles out") },
  A4: { value: "Dead, as stencilled on the valve" },
  A8: { value: "28" },
  A14: { photo: chain("hand-brake-chain.jpg", "Hand brake applied, chain tight") },
  S3: { photo: chocks("chocks.jpg", "Wheel chocked on both sides") },
  E8: { value: "2 cables, in the tool box in the cab" },
};

/** Answers to the requirement catalogue for the units of the scenario. */
export const ROAD_UNIT = {
  mark: "ZVRX", number: "2783", model: "Six-axle road unit, 2,000 hp", built: "1967", shape: "hood", "f-end": "long-hood", axles: "6", "traction-motors": "dc", engine: "yes", mu: "yes", "head-end-power": "no",
  weight: "362400", height: "15 ft 3 in", width: "10 ft 3 in", length: "60 ft 8 in", brakes: "26-L", bearings: "roller-rotating-cap", coupler: "alignment-control", "gear-ratio": "62:15", register: "clear", fuel: "180",
} as const;

export const SWITCHER = {
  mark: "ZKMX", number: "18", model: "Four-axle switcher, 900 hp", built: "1953", shape: "end-cab-switcher", "f-end": "cab-end", axles: "4", "traction-motors": "dc", engine: "yes", mu: "no", "head-end-power": "no",
  weight: "230000", brakes: "6-SL", bearings: "roller-fixed-cap", coupler: "none", register: "clear",
} as const;

export const CAB_UNIT = {
  mark: "ZHLX", number: "92", model: "Four-axle cab unit, 1,500 hp", built: "1949", shape: "cab", "f-end": "cab-end", axles: "4", "traction-motors": "dc", engine: "yes", mu: "no", "head-end-power": "yes",
  weight: "259000", brakes: "26-L", bearings: "roller-rotating-cap", coupler: "alignment-control", register: "clear",
} as const;

export const PLANT_UNIT = { mark: "ZTBX", number: "4401", model: "Four-axle road switcher", built: "1972", shape: "hood", "f-end": "short-hood", axles: "4", brakes: "26-L", bearings: "", coupler: "", weight: "" } as const;
