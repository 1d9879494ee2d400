import { closeDb, db } from "@/db/client";
import { loadDemo } from "./demo";

// A program of its own, because the database client reads its address from the environment once, at first use.
try {
  await loadDemo(db());
} finally {
  await closeDb();
}
