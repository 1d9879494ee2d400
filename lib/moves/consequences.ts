/** What an answer usually brings with it. It informs: nothing here forbids a move. */
export type Consequence = { key: "bearings" | "coupler" | "brakes"; weight: "info" | "caution"; text: string };

const BEARINGS: Readonly<Record<string, Omit<Consequence, "key">>> = {
  plain: {
    weight: "caution",
    text: "Plain bearings are in general not accepted in interchange. Such a unit goes by private agreement with each carrier, or on a truck; ask every carrier of the route before you open the move.",
  },
  "roller-fixed-cap": { weight: "caution", text: "Some carriers take only bearings whose end caps turn with the axle. Ask every carrier of the route; changed wheelsets may be what it comes to." },
  "roller-rotating-cap": { weight: "info", text: "Sealed roller bearings whose caps turn are what carriers expect. The inspector looks at every journal end." },
};

const COUPLER: Readonly<Record<string, Omit<Consequence, "key">>> = {
  "alignment-control": { weight: "info", text: "Alignment control is what carriers expect. The inspector looks at the shank at the pin hole and at the draft gear’s marking." },
  "stop-blocks": { weight: "caution", text: "Stop blocks do not count as alignment control with every carrier. Such a unit may be sent at the rear of a train or in a special train, at extra cost." },
  "push-back": { weight: "caution", text: "Push-back and shear-back couplers do not count as alignment control with every carrier. Such a unit may be sent at the rear of a train or in a special train, at extra cost." },
  none: { weight: "caution", text: "Without alignment control the coupler can swing sideways when it is pushed. Carriers limit where in the train such a unit may go, or refuse it; ask every carrier of the route." },
};

const BRAKES: Readonly<Record<string, Omit<Consequence, "key">>> = {
  other: { weight: "caution", text: "For brake equipment that is not in the list, the set-up for being hauled dead comes from the maker’s instructions and a qualified person. The prep list then asks for it in words." },
  electronic: { weight: "caution", text: "A computer-controlled brake is set up for being hauled dead by its maker’s instructions and the carrier’s. The prep list then asks for it in words." },
};

const ASK_FIRST = "Nobody has looked yet: inspectors ask this first, and the prep list keeps every step that might apply until it is known.";

/** What the three first questions bring with them, as far as they are answered. Common practice; every carrier has rules of its own. */
export function consequencesOf(answers: Readonly<Record<string, string>>): Consequence[] {
  const tables = [["bearings", BEARINGS], ["coupler", COUPLER], ["brakes", BRAKES]] as const;
  return tables.flatMap(([key, table]) => {
    const answer = answers[key] ?? "";
    const found: Omit<Consequence, "key"> | undefined = answer === "" ? { weight: "info", text: ASK_FIRST } : table[answer];
    return found ? [{ key, ...found }] : [];
  });
}
