"use client";

import { useQuery } from "@tanstack/react-query";
import { useState, type FormEvent } from "react";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { Notice } from "@/components/ui/notice";
import { PageHead } from "@/components/ui/page-head";
import { Sheet } from "@/components/ui/sheet";
import { companyOptions, editCompanyMutation } from "@/lib/companies/options";
import type { CompanyView } from "@/lib/companies/types";
import { routes } from "@/lib/routes";
import { ColleaguePart } from "./colleague-part";
import { CompanyFields } from "./company-fields";
import { GuestsPart } from "./guests-part";
import { MembersPart } from "./members-part";

/** One company for its own people: who they are, and for managers, who they shall be. */
export function CompanyBoard({ companyId, first }: { companyId: string; first: CompanyView }) {
  const { data } = useQuery({ ...companyOptions(companyId), initialData: first });
  const facts = [data.mark, data.phone].filter(Boolean).join(", ");
  return (
    <>
      <PageHead title={data.name} back={{ href: routes.companies(), label: "Companies" }} lead={facts || (data.manages ? "You manage this company." : "You belong to this company.")} />
      <div className="grid gap-5">
        {data.manages && <GuestsPart companyId={companyId} guests={data.guests} />}
        <MembersPart company={data} />
        {data.manages && <ColleaguePart companyId={companyId} invitations={data.invitations} />}
        {data.manages && <FactsPart key={data.companyId} company={data} />}
      </div>
    </>
  );
}

const typedOf = ({ name, mark, phone }: CompanyView) => ({ name, mark: mark ?? "", phone: phone ?? "" });

function FactsPart({ company }: { company: CompanyView }) {
  const [given, setGiven] = useState(() => typedOf(company));
  // What the person began from: a change by somebody else must be seen before it is written over.
  const [version, setVersion] = useState(company.version);
  const edit = useWrite(editCompanyMutation(company.companyId));
  const submit = (event: FormEvent) => {
    event.preventDefault();
    edit.send({ ...given, version }, () => setVersion(version + 1));
  };
  const stale = company.version > version && !edit.busy;
  return (
    <Sheet title="Name, mark and phone">
      <form noValidate onSubmit={submit} className="grid max-w-[520px] gap-4">
        <FormErrors errors={edit.faults.list} />
        {edit.done && !stale && <Notice kind="done" live="status">Saved.</Notice>}
        {stale && (
          <Notice live="status" title="Somebody else has changed this meanwhile">
            <p>It now reads: {[company.name, company.mark ?? "no mark", company.phone ?? "no phone"].join(", ")}. Your own entries are still below.</p>
            <Button variant="ghost" size="small" className="mt-2" onClick={() => { setVersion(company.version); edit.forget(); }}>Go on from there with mine</Button>
          </Notice>
        )}
        <CompanyFields value={given} onChange={setGiven} error={edit.faults.field} />
        <div><Button type="submit" busy={edit.busy}>Save</Button></div>
      </form>
    </Sheet>
  );
}
