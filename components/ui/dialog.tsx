"use client";

import { clsx } from "clsx";
import { useEffect, useId, useLayoutEffect, useRef, type ReactNode } from "react";

export type DialogProps = {
  open: boolean;
  /** Called for Escape and for the Close button; the parent then sets `open` to false. */
  onClose: () => void;
  title: ReactNode;
  children: ReactNode;
  /** The buttons at the end; the one that does it last. */
  actions?: ReactNode;
  /** As wide as there is room, for a picture. */
  wide?: boolean;
};

/** A native modal dialog: the browser keeps the focus inside and gives it back to what opened it. */
export function Dialog({ open, onClose, title, children, actions, wide = false }: DialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const id = useId();
  // showModal exists only as a method, so the property has to be carried over to the element.
  useEffect(() => {
    const element = dialog.current;
    if (!element || element.open === open) return;
    if (open) element.showModal();
    else element.close();
  }, [open]);
  // Closing gives the focus back; taking an open dialog out of the page does not.
  useLayoutEffect(() => {
    const element = dialog.current;
    return () => element?.close();
  }, []);

  return (
    <dialog
      ref={dialog}
      aria-labelledby={id}
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      className={clsx("m-auto max-h-[calc(100dvh-32px)] overflow-y-auto border-2 border-ink bg-sheet p-0 text-ink", wide ? "w-[min(1100px,calc(100vw-24px))]" : "w-[min(560px,calc(100vw-24px))]")}
    >
      {open && (
        <>
          <div className="flex items-start justify-between gap-4 border-b border-rule-strong px-5 py-3">
            <h2 id={id} className="py-1.5 text-21 font-[680] tracking-[-0.01em]">
              {title}
            </h2>
            <button type="button" onClick={onClose} className="min-h-11 px-2 text-14 font-[620] underline underline-offset-4">
              Close
            </button>
          </div>
          <div className="px-5 py-4">{children}</div>
          {actions && <div className="flex flex-wrap justify-end gap-2.5 border-t border-rule px-5 py-3.5 max-sm:grid max-sm:auto-cols-fr max-sm:grid-flow-col max-sm:*:min-h-13">{actions}</div>}
        </>
      )}
    </dialog>
  );
}
