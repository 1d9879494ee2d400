import { findRequirement } from "./catalogue";

const WORDS: Readonly<Record<string, string>> = {
  companyId: "Company", legs: "Route", aliases: "Other marks and numbers", "origin.name": "Where it stands", "origin.place": "Where it stands, town", "origin.zone": "Where it stands, time zone",
  "destination.name": "Where it goes", "destination.place": "Where it goes, town", "destination.zone": "Where it goes, time zone", wantedFrom: "Not before", wantedTo: "Wanted by", note: "Note",
};
const LEG_WORDS: Readonly<Record<string, string>> = { carrierName: "carrier", carrierMark: "carrier’s code", toPlace: "interchange", toZone: "time zone", miles: "miles", payer: "who pays", payerName: "payer’s name" };

/** A field of the form in words: `legs.1.toPlace` is "Leg 2, interchange". */
export function fieldWords(path: string): string {
  const [first = "", second = "", third = ""] = path.split(".");
  if (first === "answers") return findRequirement(second)?.question ?? second;
  if (first === "legs" && second !== "") return `Leg ${Number(second) + 1}, ${LEG_WORDS[third] ?? third}`;
  return WORDS[path] ?? WORDS[first] ?? path;
}
