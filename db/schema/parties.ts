import { boolean, index, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar } from "drizzle-orm/mysql-core";
import { SEAT_PARTS } from "@/lib/access/vocabulary";
import { code, id, instant, label, sha256 } from "../columns";
import { users } from "./auth";
import { legs, moves } from "./moves";

/** A person's right to see all of a company's moves and act in its seats. */
export const companyMembers = mysqlTable("company_members", {
  companyId: id("company_id").notNull(),
  userId: id("user_id").notNull().references(() => users.id),
  /** May admit, change and remove the company's people. */
  manager: boolean("manager").notNull().default(false),
  inspects: boolean("inspects").notNull().default(false),
  bills: boolean("bills").notNull().default(false),
  dispatches: boolean("dispatches").notNull().default(false),
  joinedAt: instant("joined_at").notNull(),
  /** Null while somebody of another company invited them and no manager has admitted them: they then see only the seats in seat_people. */
  admittedAt: instant("admitted_at"),
  removedAt: instant("removed_at"),
}, (t) => [primaryKey({ columns: [t.companyId, t.userId] }), index("company_members_user").on(t.userId)]);

/** Which company sits where on a move. A row here is what makes a move visible to its people. */
export const moveSeats = mysqlTable("move_seats", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  companyId: id("company_id").notNull(),
  part: mysqlEnum("part", SEAT_PARTS).notNull(),
  /** Set for a carrier and for a payer. */
  legId: id("leg_id").references(() => legs.id),
  /** The leg's id or `-`: unique keys let null repeat. */
  legKey: code("leg_key").notNull().default("-"),
  createdAt: instant("created_at").notNull(),
  removedAt: instant("removed_at"),
}, (t) => [unique("move_seats_once").on(t.moveId, t.companyId, t.part, t.legKey), index("move_seats_company").on(t.companyId, t.moveId)]);

/** Somebody invited to one seat of a company that has not admitted them to all of its moves. */
export const seatPeople = mysqlTable("seat_people", {
  seatId: id("seat_id").notNull().references(() => moveSeats.id),
  userId: id("user_id").notNull().references(() => users.id),
  inspects: boolean("inspects").notNull().default(false),
  bills: boolean("bills").notNull().default(false),
  dispatches: boolean("dispatches").notNull().default(false),
  joinedAt: instant("joined_at").notNull(),
  removedAt: instant("removed_at"),
}, (t) => [primaryKey({ columns: [t.seatId, t.userId] }), index("seat_people_user").on(t.userId)]);

/** A letter of invitation: who, for which company, in which part; good for 14 days and one use. */
export const invitations = mysqlTable("invitations", {
  id: id("id").primaryKey(),
  /** Null: invited into the company only. */
  moveId: id("move_id").references(() => moves.id),
  seatId: id("seat_id").references(() => moveSeats.id),
  companyId: id("company_id").notNull(),
  email: varchar("email", { length: 254 }).notNull(),
  name: label("name"),
  inspects: boolean("inspects").notNull().default(false),
  bills: boolean("bills").notNull().default(false),
  dispatches: boolean("dispatches").notNull().default(false),
  tokenHash: sha256("token_hash").notNull(),
  invitedBy: id("invited_by").notNull().references(() => users.id),
  createdAt: instant("created_at").notNull(),
  expiresAt: instant("expires_at").notNull(),
  acceptedAt: instant("accepted_at"),
  acceptedBy: id("accepted_by").references(() => users.id),
  revokedAt: instant("revoked_at"),
}, (t) => [unique("invitations_token").on(t.tokenHash), index("invitations_move").on(t.moveId), index("invitations_email").on(t.email)]);

/** A link by which a notify party follows a move: sightings, no names, no money. */
export const followLinks = mysqlTable("follow_links", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  label: label("label").notNull(),
  email: varchar("email", { length: 254 }),
  tokenHash: sha256("token_hash").notNull(),
  createdBy: id("created_by").notNull().references(() => users.id),
  createdAt: instant("created_at").notNull(),
  expiresAt: instant("expires_at").notNull(),
  revokedAt: instant("revoked_at"),
  lastUsedAt: instant("last_used_at"),
  uses: int("uses").notNull().default(0),
}, (t) => [unique("follow_links_token").on(t.tokenHash), index("follow_links_move").on(t.moveId)]);
