const THINGS = [
  { name: "Acceptance", who: "The carrier’s inspector", what: "signs that the unit is mechanically fit to go, with restrictions and how long it holds. Refused while a finding that stops the move is open or the prep is unsigned. Money has no say in it." },
  { name: "Billing cleared", who: "The carrier’s clerk, or a paid quote,", what: "says that the charges are settled or credit is agreed. The others read met or not met, never an amount." },
  { name: "Movement instruction", who: "The carrier’s transport desk", what: "says under which bill of lading, and when, the unit moves. Given when acceptance and billing stand." },
  { name: "Released", who: "The owner", what: "tenders the unit to the carrier. Then the carrier pulls it; pulled can’t be recorded before all four stand." },
] as const;

/** The four steps that look alike from afar and are said by four different people. */
export function FourThings() {
  return (
    <ol className="grid border-t border-l border-rule-strong bg-sheet sm:grid-cols-2 lg:grid-cols-4">
      {THINGS.map(({ name, who, what }, at) => (
        <li key={name} className="border-r border-b border-rule-strong px-4 pt-3 pb-4">
          <p className="figure text-ink-2">{at + 1}</p>
          <h3 className="mt-0.5 text-17 font-[680]">{name}</h3>
          <p className="mt-1.5 text-14">
            <b>{who}</b> {what}
          </p>
        </li>
      ))}
    </ol>
  );
}
