import { plainList } from "@/lib/account/words";

/** Who is signed in, for which company, as the bar says it. */
export function PersonLink({ name, companies }: { name: string; companies: readonly string[] }) {
  return <span className="max-w-[38ch] truncate">{companies.length === 0 ? name : `${name}, ${plainList(companies, 1)}`}</span>;
}
