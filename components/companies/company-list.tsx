"use client";

import { useQuery } from "@tanstack/react-query";
import { Empty } from "@/components/ui/empty";
import { LinkButton, TextLink } from "@/components/ui/link-button";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { companiesOptions } from "@/lib/companies/options";
import type { CompanySummary } from "@/lib/companies/types";
import { worksWords } from "@/lib/parties/words";
import { routes } from "@/lib/routes";

const doing = (one: CompanySummary) => [one.manager ? "manager" : "", worksWords(one)].filter(Boolean).join(", ") || "member";

/** The companies that somebody belongs to, and those that have yet to admit them. */
export function CompanyList({ first }: { first: CompanySummary[] }) {
  const { data } = useQuery({ ...companiesOptions(), initialData: first });
  if (data.length === 0) {
    return (
      <Empty title="You belong to no company yet." action={<LinkButton href={routes.newCompany()}>Add a company</LinkButton>}>
        Moves belong to companies: to open one, add the company that owns the locomotive, or yours if you act for the owner. Who is invited to a move joins their company by the letter.
      </Empty>
    );
  }
  return (
    <Table caption="Companies" framed stack>
      <thead>
        <tr><Th>Company</Th><Th>Mark</Th><Th>You are</Th><Th>State</Th></tr>
      </thead>
      <tbody>
        {data.map((one) => (
          <tr key={one.companyId}>
            <Td label="Company">{one.admitted ? <TextLink href={routes.company(one.companyId)} className="font-[620]">{one.name}</TextLink> : <b>{one.name}</b>}</Td>
            <Td label="Mark" mono>{one.mark ?? "none"}</Td>
            <Td label="You are">{one.admitted ? doing(one) : "guest on the moves you were invited to"}</Td>
            <Td label="State">
              {!one.admitted && <State tone="brass">Waits for a manager to admit you</State>}
              {one.asking > 0 && <State tone="brass">{one.asking === 1 ? "1 asks to be admitted" : `${one.asking} ask to be admitted`}</State>}
              {one.admitted && one.asking === 0 && <State>Admitted</State>}
            </Td>
          </tr>
        ))}
      </tbody>
    </Table>
  );
}
