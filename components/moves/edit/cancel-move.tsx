"use client";

import { useState } from "react";
import { Button } from "@/components/ui/button";
import type { CaseFile } from "@/lib/moves/types";
import { CancelDialog } from "./forms";

/** Opens the question whether the case shall end without the move. */
export function CancelMove({ file }: { file: CaseFile }) {
  const [open, setOpen] = useState(false);
  return (
    <>
      <Button variant="ghost" onClick={() => setOpen(true)}>
        Cancel the move
      </Button>
      {open && <CancelDialog file={file} onClose={() => setOpen(false)} />}
    </>
  );
}
