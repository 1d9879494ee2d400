/** What the application's database user may do with a table; `UPDATE(a, b)` is a grant on columns. */
export type Grant = "SELECT" | "INSERT" | "UPDATE" | "DELETE" | `UPDATE(${string})`;

const READ_WRITE: Grant[] = ["SELECT", "INSERT", "UPDATE"];
const APPEND: Grant[] = ["SELECT", "INSERT"];

/** One row per table; the migrate step grants exactly this and refuses to run when a table has no row. */
export const GRANTS: Record<string, Grant[]> = {
  users: READ_WRITE,
  sessions: ["SELECT", "INSERT", "UPDATE", "DELETE"],
  accounts: ["SELECT", "INSERT", "UPDATE", "DELETE"],
  verifications: ["SELECT", "INSERT", "UPDATE", "DELETE"],
  companies: READ_WRITE,
  company_members: READ_WRITE,
  move_drafts: ["SELECT", "INSERT", "UPDATE", "DELETE"],
  case_counters: READ_WRITE,
  moves: READ_WRITE,
  equipment: READ_WRITE,
  equipment_aliases: ["SELECT", "INSERT", "DELETE"],
  legs: READ_WRITE,
  waits: ["SELECT", "INSERT", "UPDATE(until)"],
  move_seats: READ_WRITE,
  seat_people: READ_WRITE,
  invitations: READ_WRITE,
  follow_links: READ_WRITE,
  record: APPEND,
  site_log: APPEND,
  signatures: ["SELECT", "INSERT", "UPDATE(lifted_at, lifted_why)"],
  outbox: READ_WRITE,
  attempts: ["SELECT", "INSERT", "UPDATE(answer)", "DELETE"],
  limit_counters: ["SELECT", "INSERT", "UPDATE", "DELETE"],
  photos: READ_WRITE,
  photo_uses: APPEND,
  prep_items: READ_WRITE,
  inspections: APPEND,
  findings: ["SELECT", "INSERT", "UPDATE(state, rounds, version)"],
  finding_entries: APPEND,
  acceptances: ["SELECT", "INSERT", "UPDATE(withdrawn_at, withdrawn_why)"],
  quotes: ["SELECT", "INSERT", "UPDATE(state, payer_company_id, agreed_by, agreed_at, voided_at, voided_why, version)"],
  fee_lines: APPEND,
  payments: READ_WRITE,
  payment_events: APPEND,
  ledger_postings: APPEND,
  billing_clearances: APPEND,
  instructions: ["SELECT", "INSERT", "UPDATE(withdrawn_at, withdrawn_why)"],
  releases: APPEND,
  sightings: ["SELECT", "INSERT", "UPDATE(retracted_at, retracted_why)"],
  arrivals: APPEND,
};
