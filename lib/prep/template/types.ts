import type { BrakeSchedule, TractionMotors } from "@/lib/moves/vocabulary";
import type { PrepGroup, PrepPhase } from "../vocabulary";

/** "common practice" marks a row for which no published source was read. */
export type PrepSource = "published" | "common practice";

/** What is known about a unit when its checklist is made; null or absent means nobody has looked yet. */
export type PrepFacts = {
  brakeSchedule?: BrakeSchedule | null;
  headEndPower?: boolean | null;
  muFitted?: boolean | null;
  motorsTraction?: TractionMotors | null;
  plainBearings?: boolean | null;
  /** False for a unit without an engine of its own, such as a slug or a straight electric. */
  engineFitted?: boolean | null;
};

/** Facts that must all hold. A list stands for any value in it. */
export type PrepCondition = { readonly [Fact in keyof PrepFacts]?: PrepFacts[Fact] | readonly NonNullable<PrepFacts[Fact]>[] };

/** What a person has to leave behind as proof that the item is done. */
export type PrepEvidence = {
  readonly photo: boolean;
  readonly measurement: boolean;
  readonly value: { readonly label: string; readonly unit?: string } | null;
  readonly tag: boolean;
};

/** One line of the checklist with the line that undoes it. */
export type PrepTemplateItem = {
  readonly id: string;
  readonly group: PrepGroup;
  readonly phase: PrepPhase;
  /** Place in its phase; lower comes first. */
  readonly order: number;
  readonly action: string;
  readonly why: string;
  readonly caution: string | null;
  readonly evidence: PrepEvidence;
  /** Null where the item is never undone. */
  readonly restore: { readonly action: string; readonly caution: string | null } | null;
  readonly source: PrepSource;
  /** Any one of these is enough; an empty list means every unit. */
  readonly appliesWhen: readonly PrepCondition[];
  /** The same in words. */
  readonly when: string;
};
