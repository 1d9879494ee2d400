import type { Metadata } from "next";
import { BarLink } from "@/components/front/bar-link";
import { FrontPage } from "@/components/front/front-page";
import { Footer } from "@/components/shell/footer";
import { SkipLink } from "@/components/shell/page";
import { TopBar } from "@/components/shell/top-bar";
import { LinkButton } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";

export const metadata: Metadata = { title: "Nothing here" };

/** The same words for what never was and for what the viewer may not see. Asking who looks also makes the page anew for each request, as its script must be. */
export default async function NotFound() {
  const viewer = await getViewer();
  const [href, label] = viewer ? [routes.moves(), "To your moves"] : [routes.home(), "To the first page"];
  return (
    <>
      <SkipLink />
      <TopBar homeHref={href} nav={[]}>
        {viewer ? <BarLink href={routes.moves()}>Moves of {viewer.name}</BarLink> : <BarLink href={routes.signIn()}>Sign in</BarLink>}
      </TopBar>
      <FrontPage title="Nothing here" lead="There is no such page, or it is not for you to see: a case is seen by its parties alone, and each of them sees what concerns it.">
        <LinkButton href={href}>{label}</LinkButton>
      </FrontPage>
      <Footer />
    </>
  );
}
