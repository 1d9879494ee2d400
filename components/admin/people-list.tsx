"use client";

import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { ConfirmButton } from "@/components/account/confirm-button";
import { useWrite } from "@/components/account/use-write";
import { Empty } from "@/components/ui/empty";
import { FilterBar, FilterText } from "@/components/ui/filter-box";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { adminPeopleOptions, personMutation } from "@/lib/admin/options";
import type { AdminPerson } from "@/lib/admin/types";
import { formatFullWhen } from "@/lib/moves/when";

/** People by name or address, to help them in or keep them out. */
export function PeopleList({ first, search: asked }: { first: AdminPerson[]; search: string }) {
  const [search, setSearch] = useState(asked);
  const { data = [] } = useQuery({ ...adminPeopleOptions(search), initialData: search === asked ? first : undefined });
  const short = search.trim().length < 3;
  return (
    <Sheet title="People" lead="Find somebody by a part of their name or address. Who is disabled is signed out everywhere at once and can’t come in; what they signed stays.">
      <FilterBar>
        <FilterText name="q" label="Name or address" value={search} onChange={(event) => setSearch(event.target.value)} />
      </FilterBar>
      {short || data.length === 0 ? <Empty className="mt-4" title={short ? "Nobody looked for yet." : "Nobody."}>{short ? "Type at least three characters of a name or an address." : "No account has this in its name or address."}</Empty> : (
        <Table caption="People" framed stack>
          <thead>
            <tr><Th>Person</Th><Th>Companies</Th><Th>Sessions</Th><Th>State</Th><Th><span className="sr-only">Changes</span></Th></tr>
          </thead>
          <tbody>
            {data.map((person) => (
              <PersonRow key={person.userId} person={person} />
            ))}
          </tbody>
        </Table>
      )}
    </Sheet>
  );
}

function PersonRow({ person: { userId, name, email, companies, sessions, lastUsedAt, disabledAt, emailVerified, siteAdmin } }: { person: AdminPerson }) {
  const disable = useWrite(personMutation("disable"));
  const enable = useWrite(personMutation("enable"));
  const end = useWrite(personMutation("end-sessions"));
  return (
    <tr>
      <Td label="Person"><b>{name}</b><span className="block text-ink-2 [overflow-wrap:anywhere]">{email}</span></Td>
      <Td label="Companies">{companies.join(", ") || "none"}</Td>
      <Td label="Sessions"><span className="figure">{sessions}</span>{lastUsedAt && <span className="block text-ink-2">last used {formatFullWhen(lastUsedAt, "UTC")}</span>}</Td>
      <Td label="State">
        {disabledAt ? <State tone="oxide">Disabled {disabledAt.slice(0, 10)}</State> : emailVerified ? <State tone="verdigris">Can sign in</State> : <State tone="brass">Address not checked</State>}
        {siteAdmin && <> <State tone="slate">Site administrator</State></>}
      </Td>
      <Td>
        <div className="flex flex-wrap gap-x-4">
          {sessions > 0 && (
            <ConfirmButton opener="End sessions" of={`of ${name}`} title={`End all sessions of ${name}?`} confirm="End them" body={{ userId }} write={end}>
              <p>They are signed out everywhere at once, and can sign in again.</p>
            </ConfirmButton>
          )}
          {disabledAt ? (
            <ConfirmButton opener="Enable" of={name} title={`Let ${name} in again?`} confirm="Enable" body={{ userId }} write={enable}>
              <p>Companies and seats are as they were.</p>
            </ConfirmButton>
          ) : (
            <ConfirmButton opener="Disable" of={name} title={`Disable ${name}?`} confirm="Disable" body={{ userId }} write={disable}>
              <p>They are signed out everywhere at once, and no way in works any more: password, mailed link, invitation.</p>
            </ConfirmButton>
          )}
        </div>
      </Td>
    </tr>
  );
}
