/** Whoever sits on a case, each in one part; `guest` was invited to carrier A’s seat alone and inspects there. */
export const SEATED = ["owner", "contractor", "receiver", "payer", "inspectorA", "clerkA", "deskA", "inspectorB", "clerkB", "deskB", "guest"] as const;

/** Signed in without a seat: another company's manager, a removed member of the owner, a site administrator. */
export const OUTSIDE = ["outsider", "removed", "siteAdmin"] as const;

export type Seated = (typeof SEATED)[number];
export type Outside = (typeof OUTSIDE)[number];
export type Persona = Seated | Outside;

export const PERSONAS: readonly Persona[] = [...SEATED, ...OUTSIDE];

/** Those who see what is done to the unit and what is found on it. */
export const SEE_WORK: readonly Persona[] = ["owner", "contractor", "receiver", "inspectorA", "deskA", "inspectorB", "deskB", "guest"];

/** Everybody seated but some. */
export const seatedBut = (...some: readonly Persona[]): Persona[] => SEATED.filter((one) => !some.includes(one));

/** Who acts for carrier A: they leave the case when it is not on board. */
export const CARRIER_A: readonly Persona[] = ["inspectorA", "clerkA", "deskA", "guest"];
