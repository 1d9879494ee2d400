/** Names one after the other; beyond `most` their number stands for the rest: "Vellum Ridge and 2 more". */
export function plainList(names: readonly string[], most = names.length): string {
  const shown = names.slice(0, most);
  const left = names.length - shown.length;
  const parts = left > 0 ? [...shown, `${left} more`] : shown;
  return parts.length < 2 ? (parts[0] ?? "") : `${parts.slice(0, -1).join(", ")} and ${parts.at(-1) ?? ""}`;
}
