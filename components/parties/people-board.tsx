"use client";

import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { flushSync } from "react-dom";
import { fieldId } from "@/components/ui/field-id";
import { Sheet } from "@/components/ui/sheet";
import { peopleOptions } from "@/lib/parties/options";
import type { PeopleView } from "@/lib/parties/types";
import { FollowPart } from "./follow-part";
import { InvitePart } from "./invite-part";
import { LettersPart } from "./letters-part";
import { PartyTable } from "./party-table";

/** Who is on a move; for its owner also who shall be. */
export function PeopleBoard({ moveId, first }: { moveId: string; first: PeopleView }) {
  const { data } = useQuery({ ...peopleOptions(moveId), initialData: first });
  const edits = data.mayInvite && data.open;
  const [asked, setAsked] = useState({ slot: "", times: 0 });
  const ask = (slot: string) => {
    // The form is made anew for the part; only then can the focus go into it.
    flushSync(() => setAsked({ slot, times: asked.times + 1 }));
    document.getElementById(fieldId("slot"))?.focus();
  };
  return (
    <Sheet title="People" lead="Every company on this move, in which part, and who acts for it. Each sees the part of the case that concerns it; money is seen by who pays and who is paid.">
      <PartyTable moveId={moveId} people={data} edits={edits} onInvite={ask} />
      {data.mayInvite && <LettersPart moveId={moveId} invitations={data.invitations} legs={data.legs} edits={edits} />}
      {edits && <InvitePart key={asked.times} moveId={moveId} people={data} start={asked.slot} />}
      {data.mayInvite && <FollowPart moveId={moveId} links={data.followLinks} edits={edits} />}
    </Sheet>
  );
}
