import { DEMO_PASSWORD, DEMO_PEOPLE } from "./demo-people";
import { say } from "./progress";
import type { PreparedSite } from "./site";

/** Says where the site is, who can sign in, and where its e-mails can be read. */
export function sayWelcome({ env, ports, standIns }: PreparedSite): void {
  const width = (field: "name" | "email" | "part") => Math.max(...DEMO_PEOPLE.map((person) => person[field].length));
  const [name, email, part] = [width("name"), width("email"), width("part")];
  say(`\nTowfolio is at ${env.APP_URL}\n`);
  say(`Invented people to sign in as, all with the password ${DEMO_PASSWORD}`);
  for (const person of DEMO_PEOPLE) {
    say(`  ${person.email.padEnd(email)}  ${person.part.padEnd(part)}  ${person.name.padEnd(name)}  ${person.company}`);
  }
  say("");
  if (standIns.includes("mail")) say(`E-mails that it sends stay on this machine: read them at http://localhost:${ports.mailPage}`);
  if (standIns.includes("payments")) say("Payments go to a stand-in on this machine; no money moves.");
  if (standIns.includes("uploads")) say("Photos go to a stand-in on this machine.");
  say("Ctrl-C stops everything.\n");
}
