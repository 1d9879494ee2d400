import { index, int, mysqlEnum, mysqlTable, unique, varchar } from "drizzle-orm/mysql-core";
import { PARTS } from "@/lib/access/vocabulary";
import { MOVE_STATES, STAGES, WAITS } from "@/lib/standing/vocabulary";
import { code, day, id, instant, jsonText, label, words, zone } from "../columns";
import { companies } from "./companies";
import { users } from "./auth";

/** A move being written down, before it is opened; only its own company sees it. */
export const moveDrafts = mysqlTable("move_drafts", {
  id: id("id").primaryKey(),
  companyId: id("company_id").notNull().references(() => companies.id),
  createdBy: id("created_by").notNull().references(() => users.id),
  /** The form as typed, complete or not. */
  body: jsonText<Record<string, unknown>>("body").notNull(),
  createdAt: instant("created_at").notNull(),
  updatedAt: instant("updated_at").notNull(),
  version: int("version").notNull().default(1),
}, (t) => [index("move_drafts_company").on(t.companyId)]);

/** Last case number given in a year; the row's lock keeps numbers single. */
export const caseCounters = mysqlTable("case_counters", {
  year: int("year").primaryKey(),
  last: int("last").notNull(),
});

/** One locomotive hauled dead in tow, from where it stands to where it goes: the case file. */
export const moves = mysqlTable("moves", {
  id: id("id").primaryKey(),
  /** `26-0041`: year and running number. */
  caseNumber: code("case_number").notNull(),
  ownerCompanyId: id("owner_company_id").notNull().references(() => companies.id),
  state: mysqlEnum("state", MOVE_STATES).notNull().default("open"),
  stage: mysqlEnum("stage", STAGES).notNull().default("opening"),
  originName: label("origin_name").notNull(),
  originPlace: label("origin_place").notNull(),
  originZone: zone("origin_zone").notNull(),
  destinationName: label("destination_name").notNull(),
  destinationPlace: label("destination_place").notNull(),
  destinationZone: zone("destination_zone").notNull(),
  wantedFrom: day("wanted_from"),
  wantedTo: day("wanted_to"),
  note: words("note"),
  /** Whose turn it is, kept by lib/standing; null when nobody's. */
  waitingPart: mysqlEnum("waiting_part", PARTS),
  waitingLegId: id("waiting_leg_id"),
  waitingCompanyId: id("waiting_company_id"),
  /** Name as a list shows it: the company, or the carrier that is entered by name only. */
  waitingName: label("waiting_name"),
  waitingFor: mysqlEnum("waiting_for", WAITS),
  /** How many of them, where that says something (2 answers, 6 items). */
  waitingCount: int("waiting_count"),
  waitingSince: instant("waiting_since"),
  /** Where along the route the unit is: 0 at the origin, 1 placed; thousandths. */
  progressMil: int("progress_mil").notNull().default(0),
  /** Marks, aliases, numbers and places in lower case, for the list's search. */
  searchText: varchar("search_text", { length: 1000 }).notNull(),
  openedBy: id("opened_by").notNull().references(() => users.id),
  openedAt: instant("opened_at").notNull(),
  closedAt: instant("closed_at"),
  cancelledAt: instant("cancelled_at"),
  version: int("version").notNull().default(1),
}, (t) => [unique("moves_case").on(t.caseNumber), index("moves_stage").on(t.state, t.stage), index("moves_opened").on(t.openedAt, t.id)]);

/** The unit of a move, as an inspector lists it; columns for what is computed with, the rest as facts by key of lib/moves/catalogue. */
export const equipment = mysqlTable("equipment", {
  moveId: id("move_id").primaryKey().references(() => moves.id),
  /** Exactly as stencilled. */
  mark: varchar("mark", { length: 12 }).notNull(),
  number: varchar("number", { length: 12 }).notNull(),
  /** Which end is stencilled F. */
  fEnd: code("f_end").notNull(),
  shape: code("shape").notNull(),
  axles: int("axles").notNull(),
  weightLb: int("weight_lb"),
  model: label("model"),
  builtYear: int("built_year"),
  brakeSchedule: code("brake_schedule").notNull(),
  bearings: code("bearings").notNull(),
  alignment: code("alignment").notNull(),
  /** Answers to the requirement catalogue, by key. */
  facts: jsonText<Record<string, string>>("facts").notNull(),
  version: int("version").notNull().default(1),
});

/** Other marks and numbers that a unit is known by, so that a yard finds it. */
export const equipmentAliases = mysqlTable("equipment_aliases", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  alias: varchar("alias", { length: 40 }).notNull(),
}, (t) => [unique("equipment_aliases_once").on(t.moveId, t.alias)]);

/** One carrier's stretch of the route, in order. */
export const legs = mysqlTable("legs", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  /** Counts from 1. */
  seq: int("seq").notNull(),
  carrierName: label("carrier_name").notNull(),
  carrierMark: code("carrier_mark"),
  /** Null while the carrier is entered by name only. */
  carrierCompanyId: id("carrier_company_id").references(() => companies.id),
  /** Where this carrier takes over: the origin, or the interchange with the one before. */
  fromPlace: label("from_place").notNull(),
  fromZone: zone("from_zone").notNull(),
  toPlace: label("to_place").notNull(),
  toZone: zone("to_zone").notNull(),
  miles: int("miles"),
  /** Who pays this carrier, as named at opening; the seat follows when they are invited. */
  payerName: label("payer_name"),
  payerCompanyId: id("payer_company_id").references(() => companies.id),
  version: int("version").notNull().default(1),
}, (t) => [unique("legs_seq").on(t.moveId, t.seq)]);

/** For how long a move waited on whom: closed intervals and one open one, kept by lib/standing. */
export const waits = mysqlTable("waits", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  part: mysqlEnum("part", PARTS).notNull(),
  legId: id("leg_id"),
  name: label("name").notNull(),
  waitingFor: mysqlEnum("waiting_for", WAITS).notNull(),
  since: instant("since").notNull(),
  until: instant("until"),
}, (t) => [index("waits_move").on(t.moveId, t.since)]);
