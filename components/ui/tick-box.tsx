export type TickState = "done" | "to-do" | "waiting" | "not-applicable";

const WORDS: Record<TickState, string> = { done: "Done", "to-do": "To do", waiting: "Not yet", "not-applicable": "Does not apply" };

/** A drawn box: ticked, open, open and waited for, or struck through. It says its state unless `silent`, where words beside it do. */
export function TickBox({ state, size = 18, silent = false, className }: { state: TickState; size?: 18 | 24 | 30; silent?: boolean; className?: string }) {
  const line = state === "waiting" ? "stroke-brass" : state === "not-applicable" ? "stroke-rule-strong" : "stroke-ink";
  return (
    <svg role={silent ? undefined : "img"} aria-label={silent ? undefined : WORDS[state]} aria-hidden={silent || undefined} width={size} height={size} viewBox="0 0 30 30" className={`shrink-0 ${className ?? ""}`}>
      {state === "done" ? (
        <>
          <rect x="1" y="1" width="28" height="28" className="fill-verdigris" />
          <path d="M7 15l6 6 10-13" fill="none" strokeWidth="3.6" className="stroke-on-tone" />
        </>
      ) : (
        <rect x="1.8" y="1.8" width="26.4" height="26.4" fill="none" strokeWidth={size === 18 ? 3.2 : 2.4} className={line} />
      )}
      {state === "not-applicable" && <path d="M8 15h14" fill="none" strokeWidth="3" className={line} />}
    </svg>
  );
}
