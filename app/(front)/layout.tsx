import { type ReactNode } from "react";
import { Footer } from "@/components/shell/footer";
import { SkipLink } from "@/components/shell/page";
import { TopBar } from "@/components/shell/top-bar";
import { BarLink } from "@/components/front/bar-link";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";

/** The bar around what can be read before sign-in. */
export default async function FrontLayout({ children }: { children: ReactNode }) {
  const viewer = await getViewer();
  return (
    <>
      <SkipLink />
      <TopBar homeHref={routes.home()} nav={[]}>
        {viewer ? <BarLink href={routes.moves()}>Your moves</BarLink> : <BarLink href={routes.signIn()}>Sign in</BarLink>}
      </TopBar>
      {children}
      <Footer />
    </>
  );
}
