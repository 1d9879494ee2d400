import type { Metadata } from "next";
import { load } from "@/lib/entry/load";
import { ownCompanies } from "@/lib/moves/own-companies";
import { NewMove } from "./new-move";

export const metadata: Metadata = { title: "Open a move" };

export default async function NewMovePage() {
  return <NewMove companies={await load(async (viewer) => ownCompanies(viewer))} draft={null} />;
}
