import { boolean, index, mysqlTable, text, unique, varchar } from "drizzle-orm/mysql-core";
import { id, instant } from "../columns";

/** A person who can sign in. */
export const users = mysqlTable("users", {
  id: id("id").primaryKey(),
  name: varchar("name", { length: 120 }).notNull(),
  /** Lower case, NFC; compared byte for byte. */
  email: varchar("email", { length: 254 }).notNull(),
  emailVerified: boolean("email_verified").notNull().default(false),
  image: text("image"),
  createdAt: instant("created_at").notNull(),
  updatedAt: instant("updated_at").notNull(),
  /** Helps people in and merges doubled companies; sees a case only when a party seats them. */
  siteAdmin: boolean("site_admin").notNull().default(false),
  /** Set: every session has ended and no new one begins. */
  disabledAt: instant("disabled_at"),
}, (t) => [unique("users_email").on(t.email)]);

export const sessions = mysqlTable("sessions", {
  id: id("id").primaryKey(),
  userId: id("user_id").notNull().references(() => users.id, { onDelete: "cascade" }),
  token: varchar("token", { length: 255 }).notNull(),
  expiresAt: instant("expires_at").notNull(),
  createdAt: instant("created_at").notNull(),
  updatedAt: instant("updated_at").notNull(),
  ipAddress: varchar("ip_address", { length: 64 }),
  userAgent: text("user_agent"),
}, (t) => [unique("sessions_token").on(t.token), index("sessions_user").on(t.userId)]);

/** How a person proves who they are; today a password only. */
export const accounts = mysqlTable("accounts", {
  id: id("id").primaryKey(),
  accountId: varchar("account_id", { length: 255 }).notNull(),
  providerId: varchar("provider_id", { length: 64 }).notNull(),
  userId: id("user_id").notNull().references(() => users.id, { onDelete: "cascade" }),
  accessToken: text("access_token"),
  refreshToken: text("refresh_token"),
  idToken: text("id_token"),
  accessTokenExpiresAt: instant("access_token_expires_at"),
  refreshTokenExpiresAt: instant("refresh_token_expires_at"),
  scope: text("scope"),
  /** scrypt, parameters inside. */
  password: text("password"),
  createdAt: instant("created_at").notNull(),
  updatedAt: instant("updated_at").notNull(),
}, (t) => [index("accounts_user").on(t.userId)]);

/** One-time proofs of the sign-in library (magic link, reset); values are hashed. */
export const verifications = mysqlTable("verifications", {
  id: id("id").primaryKey(),
  identifier: varchar("identifier", { length: 255 }).notNull(),
  value: text("value").notNull(),
  expiresAt: instant("expires_at").notNull(),
  createdAt: instant("created_at").notNull(),
  updatedAt: instant("updated_at").notNull(),
}, (t) => [index("verifications_identifier").on(t.identifier)]);
