"use client";

import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { Dialog } from "@/components/ui/dialog";
import { Empty } from "@/components/ui/empty";
import { FilterBar, FilterSelect, FilterText } from "@/components/ui/filter-box";
import { FormErrors } from "@/components/ui/form-errors";
import { SelectField } from "@/components/ui/select-field";
import { Sheet } from "@/components/ui/sheet";
import { State } from "@/components/ui/state";
import { Table, Td, Th } from "@/components/ui/table";
import { adminCompaniesOptions, mergeCompaniesMutation } from "@/lib/admin/options";
import type { CompanySearch } from "@/lib/admin/search";
import type { AdminCompany } from "@/lib/admin/types";

/** All companies, and the means to make one of two. */
export function CompaniesBoard({ first, search: asked }: { first: AdminCompany[]; search: CompanySearch }) {
  const [search, setSearch] = useState(asked);
  const { data = [] } = useQuery({ ...adminCompaniesOptions(search), initialData: search === asked ? first : undefined });
  return (
    <Sheet title="Companies" lead="A company is made whenever somebody invites one by name, so some come twice. Merging brings people, seats, legs and letters together; what was signed and recorded keeps the name under which it happened. It can’t be undone.">
      <FilterBar>
        <FilterText name="q" label="Name or mark" value={search.search} onChange={(event) => setSearch({ ...search, search: event.target.value })} />
        <FilterSelect name="doubled" label="Which" choices={[{ value: "1", label: "names that stand twice" }]} blank="all" value={search.doubled ? "1" : ""} onChange={(event) => setSearch({ ...search, doubled: event.target.value === "1" })} />
      </FilterBar>
      {data.length === 0 ? <Empty className="mt-4" title="No company.">{search.doubled ? "No name stands twice." : "None has this name or mark."}</Empty> : (
        <Table caption="Companies" framed stack>
          <thead>
            <tr><Th>Company</Th><Th>Mark</Th><Th>People</Th><Th>Moves</Th><Th>Since</Th><Th><span className="sr-only">Merge</span></Th></tr>
          </thead>
          <tbody>
            {data.map((one) => (
              <tr key={one.companyId}>
                <Td label="Company"><b>{one.name}</b>{one.doubled && <> <State tone="brass">Twice</State></>}</Td>
                <Td label="Mark" mono>{one.mark ?? "none"}</Td>
                <Td label="People" mono>{one.members}</Td>
                <Td label="Moves" mono>{one.moves}</Td>
                <Td label="Since" mono>{one.createdAt.slice(0, 10)}</Td>
                <Td>{data.length > 1 && <MergeDialog gone={one} others={data.filter((other) => other.companyId !== one.companyId)} />}</Td>
              </tr>
            ))}
          </tbody>
        </Table>
      )}
      {data.length === 100 && <p className="mt-3 text-14 text-ink-2">The first 100 are shown; narrow the search for others.</p>}
    </Sheet>
  );
}

const facts = (one: AdminCompany) => `${one.name} (since ${one.createdAt.slice(0, 10)}, ${one.members} people, ${one.moves} moves)`;

function MergeDialog({ gone, others }: { gone: AdminCompany; others: AdminCompany[] }) {
  const [open, setOpen] = useState(false);
  const twin = others.find((one) => one.doubled && one.name.toLowerCase() === gone.name.toLowerCase());
  const [keepId, setKeepId] = useState(twin?.companyId ?? "");
  const merge = useWrite(mergeCompaniesMutation());
  const close = () => {
    setOpen(false);
    merge.forget();
  };
  return (
    <>
      <Button variant="plain" size="small" onClick={() => setOpen(true)}>Merge into…<span className="sr-only"> another company, {gone.name}</span></Button>
      <Dialog
        open={open}
        onClose={close}
        title={`Merge ${gone.name}`}
        actions={
          <>
            <Button variant="ghost" onClick={close}>Not now</Button>
            <Button busy={merge.busy} busyWords="Merging…" aria-disabled={keepId === ""} onClick={() => keepId !== "" && merge.send({ keepId, goneId: gone.companyId }, close)}>Merge them</Button>
          </>
        }
      >
        <div className="grid gap-4">
          <FormErrors errors={merge.faults.list} title="Not merged." />
          <p className="text-15">{facts(gone)} goes. Its people become people of the company that is kept, and see all of that company’s moves.</p>
          <SelectField name={`keep-${gone.companyId}`} label="Kept" blank="choose" required choices={others.map((one) => ({ value: one.companyId, label: facts(one) }))} value={keepId} onChange={(event) => setKeepId(event.target.value)} hint="Of the companies in the list; search for both names first if one is missing." />
        </div>
      </Dialog>
    </>
  );
}
