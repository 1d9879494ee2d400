"use client";

import { useState, type ReactNode } from "react";
import { Button, type ButtonProps } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { FormErrors } from "@/components/ui/form-errors";
import type { useWrite } from "./use-write";

type ConfirmButtonProps<B, T> = {
  opener: ReactNode;
  /** What a screen reader adds to the opener, such as the name of the row. */
  of?: string;
  title: string;
  /** What will happen then. */
  children: ReactNode;
  confirm: string;
  body: B;
  write: ReturnType<typeof useWrite<B, T>>;
  variant?: ButtonProps["variant"];
};

/** Asks once more before something that can't simply be undone. */
export function ConfirmButton<B, T>({ opener, of, title, children, confirm, body, write, variant = "plain" }: ConfirmButtonProps<B, T>) {
  const [open, setOpen] = useState(false);
  const close = () => {
    setOpen(false);
    write.forget();
  };
  return (
    <>
      <Button variant={variant} size="small" onClick={() => setOpen(true)}>
        {opener}
        {of && <span className="sr-only"> {of}</span>}
      </Button>
      <Dialog
        open={open}
        onClose={close}
        title={title}
        actions={
          <>
            <Button variant="ghost" onClick={close}>Not now</Button>
            <Button busy={write.busy} busyWords="One moment…" onClick={() => write.send(body, close)}>{confirm}</Button>
          </>
        }
      >
        <FormErrors errors={write.faults.list} title="That was not done." />
        <div className="grid gap-2 text-15">{children}</div>
      </Dialog>
    </>
  );
}
