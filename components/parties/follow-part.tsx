"use client";

import { useState, type FormEvent } from "react";
import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { Empty } from "@/components/ui/empty";
import { FormErrors } from "@/components/ui/form-errors";
import { Notice } from "@/components/ui/notice";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { TextField } from "@/components/ui/text-field";
import { formatFullWhen } from "@/lib/moves/when";
import { endFollowLinkMutation, makeFollowLinkMutation } from "@/lib/parties/options";
import type { FollowLinkView } from "@/lib/parties/types";

type FollowPartProps = { moveId: string; links: FollowLinkView[]; edits: boolean };

/** Links by which notify parties follow the move without an account. */
export function FollowPart({ moveId, links, edits }: FollowPartProps) {
  return (
    <Sheet bare level={3} title="Links to follow by" lead="For notify parties: whoever holds a link sees where the unit is and how far the move is, no names and no money, for 90 days." className="mt-8">
      {links.length === 0 ? <Empty title="No links yet.">The owner makes one for each party that only wants to know where the unit is.</Empty> : <LinkTable moveId={moveId} links={links} edits={edits} />}
      {edits && <MakeLink moveId={moveId} />}
    </Sheet>
  );
}

function LinkTable({ moveId, links, edits }: FollowPartProps) {
  const end = useWrite(endFollowLinkMutation(moveId));
  return (
    <Table caption="Links to follow by" stack>
      <thead>
        <tr><Th>For</Th><Th>Made</Th><Th>Last used</Th><Th>State</Th>{edits && <Th><span className="sr-only">Changes</span></Th>}</tr>
      </thead>
      <tbody>
        {links.map((link) => (
          <tr key={link.followId}>
            <Td label="For"><b>{link.label}</b>{link.email && <span className="block text-ink-2 [overflow-wrap:anywhere]">{link.email}</span>}</Td>
            <Td label="Made"><span className="figure">{link.createdAt.slice(0, 10)}</span><span className="block text-ink-2">by {link.madeBy}</span></Td>
            <Td label="Last used" mono={link.lastUsedAt !== null}>{link.lastUsedAt ? formatFullWhen(link.lastUsedAt, "UTC") : "not yet"}</Td>
            <Td label="State"><State tone={link.state === "open" ? "slate" : "neutral"}>{link.state === "open" ? `Until ${link.expiresAt.slice(0, 10)}` : link.state === "ended" ? "Ended" : "Too old"}</State></Td>
            {edits && (
              <Td>
                {link.state === "open" && (
                  <ConfirmButton opener="End" of={`the link for ${link.label}`} title="End this link?" confirm="End it" body={{ followId: link.followId }} write={end}>
                    <p>Whoever holds it no longer sees the move. It can’t be opened again; make a new one if need be.</p>
                  </ConfirmButton>
                )}
              </Td>
            )}
          </tr>
        ))}
      </tbody>
    </Table>
  );
}

const EMPTY = { label: "", email: "" };

function MakeLink({ moveId }: { moveId: string }) {
  const [given, setGiven] = useState(EMPTY);
  const [made, setMade] = useState<{ url: string; mailed: string } | null>(null);
  const make = useWrite(makeFollowLinkMutation(moveId));
  const type = (name: keyof typeof EMPTY) => ({ name: `follow-${name}`, value: given[name], error: make.faults.field(name), onChange: (event: { target: { value: string } }) => setGiven({ ...given, [name]: event.target.value }) });
  const submit = (event: FormEvent) => {
    event.preventDefault();
    make.send(given, ({ url }) => {
      setMade({ url, mailed: given.email });
      setGiven(EMPTY);
    });
  };
  return (
    <form noValidate onSubmit={submit} className="mt-5 grid max-w-[560px] gap-4">
      <FormErrors errors={make.faults.list.map((fault) => (fault.name ? { ...fault, name: `follow-${fault.name}` } : fault))} title="No link was made." />
      {made && <MadeLink {...made} />}
      <TextField {...type("label")} label="Who follows" hint="A company or person, as the list shall name them." autoComplete="off" required />
      <TextField {...type("email")} label="E-mail address" hint="Filled in, the link is mailed there as well." type="email" autoComplete="off" />
      <div><Button type="submit" variant="ghost" busy={make.busy} busyWords="Making…">Make a link</Button></div>
    </form>
  );
}

function MadeLink({ url, mailed }: { url: string; mailed: string }) {
  const [copied, setCopied] = useState(false);
  const copy = () => void navigator.clipboard.writeText(url).then(() => setCopied(true), () => setCopied(false));
  return (
    <Notice kind="done" live="status" title={mailed ? `The link is made, and on its way to ${mailed}` : "The link is made"}>
      <p>It is shown this once; only its check sum is kept here.</p>
      <TextField className="mt-2" name="follow-url" label="Link" mono readOnly value={url} onFocus={(event) => event.target.select()} />
      <Button className="mt-2" size="small" variant="ghost" onClick={copy}>{copied ? "Copied" : "Copy it"}</Button>
    </Notice>
  );
}
