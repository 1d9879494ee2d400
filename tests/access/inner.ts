/** Functions that take part in another command's transaction, or are the path of every write: they ask nobody, since whoever calls them has. Only queries and commands may. */
export const INNER: Record<string, readonly string[]> = {
  standing: ["write", "writeOnMove", "peopleIn", "refreshStanding", "requireLeg", "allowOnLeg"],
  record: ["appendRecord", "keepSignature", "liftSignature", "appendSiteLog"],
  outbox: ["putMail", "putTask"],
  prep: ["fillPrep", "openRestore"],
  evidence: ["linkPhotos"],
  findings: ["findStandingAcceptance", "liftAcceptance"],
  fees: ["requireQuote"],
  companies: ["lockManaged"],
  parties: ["postLetter"],
};

/** What such a function takes first. */
export const INNER_TAKES: readonly string[] = ["tx", "ctx"];

/** The path of every write takes the viewer itself; each command above it is a row. */
export const WRITE_PATH: readonly string[] = ["write", "writeOnMove"];

/** Programs of this machine, such as the demo’s; nothing that answers a request. */
export const PLUMBING = /^lib\/(?:local|worker)\//;

/** Files besides queries and commands that may name one. */
export const INNER_NAMED_BY: Record<string, readonly string[]> = {
  // Mails of the sign-in library, which has no transaction of ours.
  putMail: ["lib/auth.ts"],
  // Handed to openMove, which calls it in its transaction.
  fillPrep: ["app/api/v1/moves/route.ts", "app/api/v1/drafts/[draftId]/open/route.ts"],
};
