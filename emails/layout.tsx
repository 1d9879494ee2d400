import { Body, Container, Head, Hr, Html, Link, Preview, Section, Text } from "@react-email/components";
import type { ReactNode } from "react";

const INK = "#1c232b";
const font = { fontFamily: "Archivo, Helvetica, Arial, sans-serif", color: INK } as const;
const text = { ...font, fontSize: "15px", lineHeight: "22px", margin: "0 0 12px" } as const;

/** A line or paragraph of a letter. */
export const Para = ({ children }: { children: ReactNode }) => <Text style={text}>{children}</Text>;

/** The one thing to do; the address stands below it for readers that show no buttons. */
export function Action({ url, label }: { url: string; label: string }) {
  return (
    <Section style={{ margin: "18px 0" }}>
      <Link href={url} style={{ ...font, backgroundColor: INK, color: "#ffffff", display: "inline-block", fontSize: "15px", fontWeight: 600, padding: "12px 18px", textDecoration: "none" }}>{label}</Link>
      <Text style={{ ...font, color: "#4a545e", fontSize: "13px", lineHeight: "19px", margin: "12px 0 0", wordBreak: "break-all" }}>{url}</Text>
    </Section>
  );
}

/** Frame of every letter: what it is, the letter, and what Towfolio is not. */
export function Letter({ preview, title, children }: { preview: string; title: string; children: ReactNode }) {
  return (
    <Html lang="en">
      <Head><title>{title}</title></Head>
      <Preview>{preview}</Preview>
      <Body style={{ backgroundColor: "#f4f1e8", margin: 0, padding: "24px 12px" }}>
        <Container style={{ backgroundColor: "#fdfcf8", border: "1px solid #7d7765", maxWidth: "560px", padding: "22px 26px" }}>
          <Text style={{ ...font, fontSize: "13px", fontWeight: 700, letterSpacing: "0.04em", margin: "0 0 14px" }}>TOWFOLIO</Text>
          <Text style={{ ...font, fontSize: "21px", fontWeight: 700, lineHeight: "27px", margin: "0 0 14px" }}>{title}</Text>
          {children}
          <Hr style={{ borderColor: "#c9c3b3", margin: "20px 0 12px" }} />
          <Text style={{ ...font, color: "#4a545e", fontSize: "13px", lineHeight: "19px", margin: 0 }}>Towfolio keeps the case file of a locomotive moved dead in tow. It informs; it never accepts, instructs or releases anything itself. The carrier’s rules and a qualified person’s judgement prevail.</Text>
        </Container>
      </Body>
    </Html>
  );
}
