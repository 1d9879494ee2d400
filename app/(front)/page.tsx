import type { Metadata } from "next";
import { type ReactNode } from "react";
import { FourThings } from "@/components/front/four-things";
import { SampleStrip } from "@/components/front/sample-strip";
import { WhoDoesWhat } from "@/components/front/who-does-what";
import { Page } from "@/components/shell/page";
import { LinkButton } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { routes } from "@/lib/routes";

export const metadata: Metadata = { title: { absolute: "Towfolio: one case file for a locomotive dead in tow" }, robots: { index: true, follow: false } };

function Part({ title, children }: { title: string; children: ReactNode }) {
  return (
    <section className="mt-10">
      <h2 className="mb-3 text-21 font-[680] tracking-[-0.01em]">{title}</h2>
      {children}
    </section>
  );
}

/** What this is, for somebody who has not signed in. */
export default function FrontPage() {
  return (
    <Page>
      <div className="mb-6 flex flex-wrap items-end justify-between gap-x-10 gap-y-4">
        <div className="max-w-[62ch]">
          <h1 className="text-28 font-[720] tracking-[-0.015em]">One case file for a locomotive that goes by rail dead in tow</h1>
          <p className="mt-2 text-17">
            A locomotive that may not or can’t run under its own power travels in a train like a freight car. A contractor prepares it, each carrier on the route inspects and accepts it, somebody pays, and a receiver puts it back to work. Here they all
            work in the same file, each seeing what concerns them, and everybody sees whose turn it is.
          </p>
        </div>
        <div className="flex flex-wrap gap-2.5">
          <LinkButton href={routes.signIn()}>Sign in</LinkButton>
          <LinkButton href={routes.signUp()} variant="ghost">
            Make an account
          </LinkButton>
        </div>
      </div>
      <SampleStrip />
      <Part title="Four things that are never mixed up">
        <FourThings />
      </Part>
      <Part title="Who does what">
        <div className="border border-rule-strong bg-sheet px-4 py-3 sm:px-6">
          <WhoDoesWhat />
        </div>
      </Part>
      <div className="grid gap-x-10 lg:grid-cols-2">
        <Part title="When a carrier does not work here">
          <p className="max-w-[66ch]">
            Most people at carriers will never sign in. Owner or contractor enter what the carrier told them on paper, by e-mail or by phone: from what, on which day, and who said it. It is shown as entered by them, never as the carrier’s signature. A whole
            move can be run this way.
          </p>
        </Part>
        <Part title="What is kept">
          <p className="max-w-[66ch]">
            Findings keep their measurement, its condition and their photos. What was said stays said: a wrong sighting is taken back and stays readable. Each entry of the record carries the hash of the one before it, so that a later change shows.
          </p>
        </Part>
      </div>
      <Part title="Before anybody touches the unit">
        <Notice title="Work on and around a dead locomotive can kill">
          <ul className="list-disc pl-5">
            <li>Protect the work as the rules at the place ask, with blue signals where they apply, before anybody goes on, under or between.</li>
            <li>Until the carrier’s engine is coupled the hand brake stays applied and proven, and the wheels stay chocked. Air that is in the brakes today may be gone tomorrow.</li>
            <li>Reservoirs hold air, batteries arc, capacitors stay charged. A qualified person isolates and drains them first.</li>
          </ul>
        </Notice>
        <p className="mt-3 max-w-[78ch] text-14 text-ink-2">Every limit in a case names its source and the condition under which it holds. The carrier’s rules, local codes and a qualified person’s judgment prevail over anything written here.</p>
      </Part>
    </Page>
  );
}
