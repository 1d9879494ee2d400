import { Column, Row, Section, Text } from "@react-email/components";
import type { Receipt } from "@/lib/outbox/types";
import { Action, Letter, Para } from "./layout";

export const receiptSubject = ({ unit, total }: Receipt) => `Receipt: ${total} for ${unit}`;

const cell = { fontFamily: "'IBM Plex Mono', Menlo, monospace", color: "#1c232b", fontSize: "14px", lineHeight: "20px", margin: "0 0 4px" } as const;

/** What was paid, by whom, to whom, for what. */
export function ReceiptEmail({ unit, caseNumber, payer, payee, lines, total, paidOn, reference, url }: Receipt) {
  return (
    <Letter preview={`${total} paid to ${payee}`} title={`Receipt: ${total}`}>
      <Para>{payer} paid {payee} on {paidOn} for the move of {unit}, case {caseNumber}.</Para>
      <Section>
        {[...lines, { label: "Total", amount: total }].map((line, index) => (
          <Row key={index}>
            <Column><Text style={cell}>{line.label}</Text></Column>
            <Column align="right"><Text style={{ ...cell, textAlign: "right" }}>{line.amount}</Text></Column>
          </Row>
        ))}
      </Section>
      <Para>Payment reference {reference}.</Para>
      <Action url={url} label="See the fees of this move" />
    </Letter>
  );
}
