import { acceptanceRows } from "./rows/acceptance";
import { accountRows } from "./rows/account";
import { adminRows } from "./rows/admin";
import { companyRows } from "./rows/companies";
import { evidenceRows } from "./rows/evidence";
import { feeRows } from "./rows/fees";
import { findingRows } from "./rows/findings";
import { recordRows, standingRows } from "./rows/ground";
import { inspectionRows } from "./rows/inspections";
import { movementRows } from "./rows/movement";
import { moveRows } from "./rows/moves";
import { partyRows } from "./rows/parties";
import { prepRows } from "./rows/prep";
import { timelineRows } from "./rows/timeline";
import type { Row } from "./row";

/** Every query and command of every room, and who may call it. */
export const TABLE: Readonly<Record<string, readonly Row[]>> = {
  acceptance: acceptanceRows,
  account: accountRows,
  admin: adminRows,
  companies: companyRows,
  evidence: evidenceRows,
  fees: feeRows,
  findings: findingRows,
  inspections: inspectionRows,
  movement: movementRows,
  moves: moveRows,
  parties: partyRows,
  prep: prepRows,
  record: recordRows,
  standing: standingRows,
  timeline: timelineRows,
};
