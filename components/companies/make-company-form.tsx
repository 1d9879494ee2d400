"use client";

import { useRouter } from "next/navigation";
import { useState, type FormEvent } from "react";
import { useWrite } from "@/components/account/use-write";
import { Button } from "@/components/ui/button";
import { FormErrors } from "@/components/ui/form-errors";
import { makeCompanyMutation } from "@/lib/companies/options";
import { routes } from "@/lib/routes";
import { CompanyFields } from "./company-fields";

/** Makes a company and goes to it. */
export function MakeCompanyForm() {
  const router = useRouter();
  const [given, setGiven] = useState({ name: "", mark: "", phone: "" });
  const make = useWrite(makeCompanyMutation());
  const submit = (event: FormEvent) => {
    event.preventDefault();
    make.send(given, ({ companyId }) => {
      router.push(routes.company(companyId));
      router.refresh();
    });
  };
  return (
    <form noValidate onSubmit={submit} className="grid gap-4">
      <FormErrors errors={make.faults.list} />
      <CompanyFields value={given} onChange={setGiven} error={make.faults.field} />
      <div><Button type="submit" busy={make.busy}>Add the company</Button></div>
    </form>
  );
}
