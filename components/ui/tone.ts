/** What a colour says; a word always says it too. */
export const TONES = ["oxide", "brass", "verdigris", "slate", "neutral"] as const;
/** Oxide: outside a limit, refused, overdue. Brass: somebody is waiting. Verdigris: inside a limit, accepted, met. Slate: for information. */
export type Tone = (typeof TONES)[number];

/** Words in a tone on its own wash. */
export const TONE_ON_WASH: Record<Tone, string> = {
  oxide: "text-oxide bg-oxide-wash",
  brass: "text-brass bg-brass-wash",
  verdigris: "text-verdigris bg-verdigris-wash",
  slate: "text-slate bg-slate-wash",
  neutral: "text-ink-2",
};

/** Words in a tone on the sheet or the card. */
export const TONE_TEXT: Record<Tone, string> = {
  oxide: "text-oxide",
  brass: "text-brass",
  verdigris: "text-verdigris",
  slate: "text-slate",
  neutral: "text-ink-2",
};
