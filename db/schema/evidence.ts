import { decimal, index, int, mysqlEnum, mysqlTable, primaryKey, unique, varchar } from "drizzle-orm/mysql-core";
import { PHOTO_STATES, PHOTO_SUBJECTS } from "@/lib/evidence/vocabulary";
import { code, id, instant, label, sha256 } from "../columns";
import { users } from "./auth";
import { moves } from "./moves";

/** A picture taken as evidence. The original is never altered; what screens show is a preview without its metadata. */
export const photos = mysqlTable("photos", {
  id: id("id").primaryKey(),
  moveId: id("move_id").notNull().references(() => moves.id),
  /** Made on the phone; a repeated announcement finds its row. */
  clientId: code("client_id").notNull(),
  takenBy: id("taken_by").notNull().references(() => users.id),
  companyId: id("company_id").notNull(),
  name: label("name").notNull(),
  type: code("type").notNull(),
  sizeBytes: int("size_bytes").notNull(),
  /** Of the original's bytes, computed on the phone and compared with what arrived. */
  sha256: sha256("sha256").notNull(),
  widthPx: int("width_px"),
  heightPx: int("height_px"),
  /** As the picture itself says, wall time of the camera in its zone where it tells one. */
  capturedAt: instant("captured_at"),
  latitude: decimal("latitude", { precision: 9, scale: 6 }),
  longitude: decimal("longitude", { precision: 9, scale: 6 }),
  camera: label("camera"),
  state: mysqlEnum("state", PHOTO_STATES).notNull().default("registered"),
  refusedWhy: label("refused_why"),
  /** Keys at the file service. */
  proofKey: varchar("proof_key", { length: 200 }),
  originalKey: varchar("original_key", { length: 200 }),
  previewKey: varchar("preview_key", { length: 200 }),
  createdAt: instant("created_at").notNull(),
  proofAt: instant("proof_at"),
  originalAt: instant("original_at"),
  keptAt: instant("kept_at"),
}, (t) => [unique("photos_client").on(t.clientId), unique("photos_proof").on(t.proofKey), unique("photos_original").on(t.originalKey), index("photos_move").on(t.moveId, t.createdAt), index("photos_state").on(t.state, t.createdAt)]);

/** What a photo is evidence for. */
export const photoUses = mysqlTable("photo_uses", {
  photoId: id("photo_id").notNull().references(() => photos.id),
  subject: mysqlEnum("subject", PHOTO_SUBJECTS).notNull(),
  subjectId: id("subject_id").notNull(),
  moveId: id("move_id").notNull().references(() => moves.id),
  at: instant("at").notNull(),
}, (t) => [primaryKey({ columns: [t.photoId, t.subject, t.subjectId] }), index("photo_uses_subject").on(t.subject, t.subjectId)]);
