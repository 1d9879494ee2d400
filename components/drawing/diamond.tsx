import { type HandoverTone } from "./strip";

const LOOK: Record<HandoverTone, { box: string; sign: string | null; line: string }> = {
  met: { box: "fill-verdigris stroke-verdigris", sign: "M-6 0l4.5 4.5L6.5-5", line: "stroke-on-tone" },
  waiting: { box: "fill-brass-wash stroke-brass", sign: "M-6 0h.01M0 0h.01M6 0h.01", line: "stroke-brass" },
  ahead: { box: "fill-sheet stroke-rule-strong", sign: null, line: "" },
  stopped: { box: "fill-oxide-wash stroke-oxide", sign: "M-5-5L5 5M5-5L-5 5", line: "stroke-oxide" },
};

export const TONE_WORDS: Record<HandoverTone, string> = { met: "met", waiting: "waiting", ahead: "ahead", stopped: "stopped" };

/** A hand-over on the track, centred on the origin: ticked, waiting (three dots), empty or crossed. `half` is half its diagonal. */
export function Diamond({ tone, half = 17 }: { tone: HandoverTone; half?: number }) {
  const { box, sign, line } = LOOK[tone];
  const scale = half / 17;
  return (
    <g>
      <path d={`M0-${half}L${half} 0L0 ${half}L-${half} 0z`} strokeWidth={half > 10 ? 2.5 : 2} className={box} />
      {sign && half > 7 && <path d={sign} transform={`scale(${scale})`} fill="none" strokeWidth="2.6" strokeLinecap="round" className={line} />}
    </g>
  );
}
