import type { Stage } from "@/lib/standing/vocabulary";

/** How far a move is, as a list shows it. */
export const STAGE_LABELS: Record<Stage, string> = {
  opening: "Opening",
  preparing: "Preparing",
  inspecting: "Inspecting",
  billing: "Billing",
  instructing: "Instructing",
  ready: "Ready to go",
  moving: "Under way",
  interchange: "At the interchange",
  placed: "Placed",
  restoring: "Restoring",
  closed: "Closed",
  cancelled: "Cancelled",
};

/** What the state says besides its word; a unit that stands between two carriers is nobody's, hence the loudest. */
export const STAGE_TONES: Record<Stage, "oxide" | "brass" | "verdigris" | "slate" | "neutral"> = {
  opening: "neutral",
  preparing: "neutral",
  inspecting: "brass",
  billing: "brass",
  instructing: "brass",
  ready: "verdigris",
  moving: "slate",
  interchange: "oxide",
  placed: "verdigris",
  restoring: "neutral",
  closed: "neutral",
  cancelled: "neutral",
};
