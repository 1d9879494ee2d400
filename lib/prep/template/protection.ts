import { proof } from "./proof";
import type { PrepTemplateItem } from "./types";

/** What stands before anyone goes on, under or between. 49 CFR 218.21 to 218.30 for the blue signals; who may remove them (218.23) is from memory. */
export const PROTECTION: readonly PrepTemplateItem[] = [
  {
    id: "S1",
    group: "safety",
    phase: "where-it-stands",
    order: 10,
    action:
      "Agree the blue-signal protection with whoever controls the track, and put it up: a blue signal at each switch that gives access, each of those switches lined away and locked (on a crossover, both ends), and one on a controlling locomotive where its engineer sees it.",
    why: "A blue signal is what tells a crew that people are on, under or between the equipment.",
    caution:
      "Nobody goes on, under or between before it is up. A signal belongs to the group that placed it; only they take it down. On a servicing track a locked derail at least 50 ft away counts only where speed is 5 mph or less. On carrier property, get permission and an escort where one is asked for, and follow that carrier's own rules.",
    evidence: proof("P", { label: "Agreed with, and where each signal stands" }),
    restore: null,
    source: "published",
    appliesWhen: [],
    when: "On every unit, before any other item.",
  },
  {
    id: "S2",
    group: "safety",
    phase: "where-it-stands",
    order: 20,
    action: "Apply the hand brake and prove that it holds the unit where it stands.",
    why: "Once its air is drained and it stands alone, nothing else holds the unit but this brake and the chocks.",
    caution: "Air brakes leak off and do not count as holding. If the hand brake does not hold, stop and secure the unit another way before any air is drained.",
    evidence: proof("P", { label: "How it was proven" }),
    restore: null,
    source: "published",
    appliesWhen: [],
    when: "On every unit, before any work on brakes or running gear.",
  },
  {
    id: "S3",
    group: "safety",
    phase: "where-it-stands",
    order: 30,
    action: "Chock a wheel on both sides of its tread, tight to the rail, and note which wheel.",
    why: "A second hold that does not depend on the chain and rigging of the hand brake.",
    caution: "Keep hands and feet clear of the tread while setting chocks. The chocks stay until the carrier's engine is coupled.",
    evidence: proof("P", { label: "Wheel chocked, and number of chocks" }),
    restore: null,
    source: "published",
    appliesWhen: [],
    when: "On every unit, straight after the hand brake.",
  },
];
