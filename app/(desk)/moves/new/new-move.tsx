import { MoveForm, type MoveFormProps } from "@/components/moves/new/move-form";
import { Page } from "@/components/shell/page";
import { Empty } from "@/components/ui/empty";
import { LinkButton } from "@/components/ui/link-button";
import { PageHead } from "@/components/ui/page-head";
import { routes } from "@/lib/routes";

/** The page of the form, for a new move and for a draft that is taken up again. */
export function NewMove({ companies, draft }: MoveFormProps) {
  return (
    <Page width="reading">
      <PageHead
        title="Open a move"
        back={{ href: routes.moves(), label: "Moves" }}
        lead="One locomotive, from where it stands to where it goes, dead in tow. You can leave at any time: what you typed waits as a draft among your moves."
      />
      {companies.length > 0 ? (
        <MoveForm companies={companies} draft={draft} />
      ) : (
        <Empty title="First, a company." action={<LinkButton href={routes.companies()}>Name your company</LinkButton>}>
          A move is opened by the company that owns the unit, so that colleagues can work on it too. You belong to none yet. Name yours, or ask a colleague who is here already to invite you.
        </Empty>
      )}
    </Page>
  );
}
