import { Table, Td, Th } from "@/components/ui/table";
import { formatMoney } from "@/lib/fees/money";
import type { QuoteView } from "@/lib/fees/types";
import { FEE_LABELS } from "@/lib/fees/vocabulary";

/** What a quote asks, line by line, with its total. */
export function QuoteTable({ quote }: { quote: QuoteView }) {
  return (
    <Table caption={`Lines of quote ${quote.number}`}>
      <thead>
        <tr>
          <Th className="w-1/4">For</Th>
          <Th>What</Th>
          <Th className="text-right!">Amount</Th>
        </tr>
      </thead>
      <tbody>
        {quote.lines.map((line) => (
          <tr key={line.id}>
            <Td>{FEE_LABELS[line.kind]}</Td>
            <Td className="[overflow-wrap:anywhere]">{line.description}</Td>
            <Td mono className="text-right whitespace-nowrap">{formatMoney(line.amountCents)}</Td>
          </tr>
        ))}
        <tr>
          <th scope="row" colSpan={2} className="font-[680]!">Total</th>
          <Td mono className="text-right font-semibold! whitespace-nowrap">{formatMoney(quote.totalCents)}</Td>
        </tr>
      </tbody>
    </Table>
  );
}
