"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { CaseFile } from "@/lib/moves/types";
import { EndsForm } from "./forms";

/** Where the move begins and ends, its wanted days and its note; the owner’s to change. */
export function EndsEditor({ file }: { file: CaseFile }) {
  const [open, setOpen] = useState(false);
  if (open) return <EndsForm file={file} onDone={() => setOpen(false)} />;
  return (
    <Button variant="ghost" size="small" className="mt-4" onClick={() => setOpen(true)}>
      Change the ends, the wanted days or the note
    </Button>
  );
}
