/** Everybody and everything of the demo scenario is invented; the password is for this scenario alone. */
export const DEMO_PASSWORD = "towline demo 2026";

type Works = { manager?: true; inspects?: true; bills?: true; dispatches?: true; siteAdmin?: true };

/** A person of the demo: where they work and what they do there. */
export type DemoPerson = { key: string; name: string; email: string; part: string; company: string; works: Works };

const person = (key: string, name: string, email: string, part: string, company: string, works: Works = {}): DemoPerson => ({ key, name, email, part, company, works });

/** One person for each part, and the second carrier's. */
export const DEMO_PEOPLE = [
  person("owner", "R. Okafor", "okafor@vellum-ridge.example", "owner", "Vellum Ridge Heritage Line", { manager: true }),
  person("contractor", "T. Ibarra", "ibarra@ibarra-rail.example", "contractor", "Ibarra Rail Mechanical", { manager: true }),
  person("inspector", "V. Sorrel", "sorrel@quillan-sandbar.example", "inspector, first carrier", "Quillan & Sandbar", { inspects: true }),
  person("clerk", "N. Quade", "quade@quillan-sandbar.example", "billing clerk, first carrier", "Quillan & Sandbar", { bills: true, manager: true }),
  person("desk", "D. Sandoval", "sandoval@quillan-sandbar.example", "transport desk, first carrier", "Quillan & Sandbar", { dispatches: true }),
  person("nextInspector", "K. Marsh", "marsh@sable-mountain.example", "inspector, second carrier", "Sable Mountain Lines", { inspects: true }),
  person("nextClerk", "P. Tarn", "tarn@sable-mountain.example", "clerk and desk, second carrier", "Sable Mountain Lines", { bills: true, dispatches: true, manager: true }),
  person("receiver", "M. Alder", "alder@quill-creek.example", "receiver", "Quill Creek Shops", { manager: true }),
  person("payer", "F. Fenn", "fenn@fenn-valley.example", "named payer", "Fenn Valley Fund", { manager: true }),
  person("admin", "A. Keeper", "keeper@towfolio.example", "site administrator", "", { siteAdmin: true }),
] as const satisfies readonly DemoPerson[];

export type DemoKey = (typeof DEMO_PEOPLE)[number]["key"];
