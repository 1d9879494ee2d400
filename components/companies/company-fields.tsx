import { TextField } from "@/components/ui/text-field";
import type { CompanyFacts } from "@/lib/companies/options";

type CompanyFieldsProps = { value: CompanyFacts; onChange: (value: CompanyFacts) => void; error: (name: string) => string | null };

/** Name, mark and phone of a company. */
export function CompanyFields({ value, onChange, error }: CompanyFieldsProps) {
  const field = (name: keyof CompanyFacts) => ({ name, value: value[name], error: error(name), onChange: (event: { target: { value: string } }) => onChange({ ...value, [name]: event.target.value }) });
  return (
    <>
      <TextField {...field("name")} label="Company" hint="As it stands on its letters." autoComplete="organization" required />
      <TextField {...field("mark")} label="Carrier code or reporting mark" hint="Two to four letters, where it has one." mono autoCapitalize="characters" autoComplete="off" className="max-w-60" />
      <TextField {...field("phone")} label="Phone" hint="Where its desk is reached." type="tel" autoComplete="tel" className="max-w-96" />
    </>
  );
}
