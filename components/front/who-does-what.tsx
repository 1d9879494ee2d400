import { RowHead, Table, Td, Th } from "@/components/ui/table";

const PARTS = [
  { part: "Owner", does: "Opens the move, invites the others, agrees to the charges, releases the unit to the carrier.", reads: "Everything." },
  { part: "Contractor", does: "Prepares the unit where it stands and when coupled, answers findings with work, measurements and photos.", reads: "Everything but charges." },
  { part: "Carrier’s inspector", does: "Inspects, writes down findings, clears them, signs the acceptance of the carrier’s leg.", reads: "Prep, findings and answers, also those of the other carriers." },
  { part: "Carrier’s billing clerk", does: "Quotes the charges of the leg and says when billing is cleared.", reads: "The charges of that leg, never another carrier’s." },
  { part: "Carrier’s transport desk", does: "Gives the movement instruction and reports where the unit is.", reads: "Prep, findings and the movement." },
  { part: "Receiver", does: "Looks the unit over on arrival, puts back what was changed for the tow, closes the move.", reads: "Prep, findings and the movement." },
  { part: "Named payer", does: "Agrees to and pays the charges of a leg.", reads: "That leg and the movement." },
  { part: "Notify party", does: "Nothing; follows by a link, without an account.", reads: "Sightings. No names, no charges." },
] as const;

/** The parts on a move, what each does and what each reads. */
export function WhoDoesWhat() {
  return (
    <Table caption="Who does what on a move" stack>
      <thead>
        <tr>
          <Th>Part</Th>
          <Th>Does</Th>
          <Th>Reads</Th>
        </tr>
      </thead>
      <tbody>
        {PARTS.map(({ part, does, reads }) => (
          <tr key={part}>
            <RowHead className="font-[620]! sm:w-52">{part}</RowHead>
            <Td label="Does">{does}</Td>
            <Td label="Reads">{reads}</Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
