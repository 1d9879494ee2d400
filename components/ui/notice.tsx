import { clsx } from "clsx";
import { type ReactNode } from "react";

export type NoticeKind = "caution" | "stop" | "info" | "done";

const KINDS: Record<NoticeKind, string> = {
  caution: "border-brass bg-brass-wash",
  stop: "border-oxide bg-oxide-wash",
  info: "border-slate bg-slate-wash",
  done: "border-verdigris bg-verdigris-wash",
};

export type NoticeProps = {
  kind?: NoticeKind;
  title?: ReactNode;
  /** For what appears after something was done: "status" waits for a pause in reading, "alert" does not. */
  live?: "status" | "alert";
  className?: string;
  children: ReactNode;
};

/** A caution or a piece of information, with a thick rule at its left. */
export function Notice({ kind = "caution", title, live, className, children }: NoticeProps) {
  return (
    <div role={live ?? "note"} className={clsx("border-l-[5px] px-3.5 py-2.5 text-14", KINDS[kind], className)}>
      {title && <p className="font-[680]">{title}</p>}
      {children}
    </div>
  );
}
