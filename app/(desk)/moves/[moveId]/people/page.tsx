import type { Metadata } from "next";
import { PeopleBoard } from "@/components/parties/people-board";
import { load } from "@/lib/entry/load";
import { getPeople } from "@/lib/parties/queries";

export const metadata: Metadata = { title: "People" };

export default async function PeoplePage({ params }: { params: Promise<{ moveId: string }> }) {
  const { moveId } = await params;
  const people = await load((viewer) => getPeople(viewer, moveId));
  return <PeopleBoard moveId={moveId} first={people} />;
}
