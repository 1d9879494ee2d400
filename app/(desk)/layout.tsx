import { headers } from "next/headers";
import { redirect } from "next/navigation";
import { type ReactNode } from "react";
import { Providers } from "@/app/providers";
import { SignOutButton } from "@/components/account/sign-out-button";
import { UploadQueue } from "@/components/evidence/upload-queue";
import { Footer } from "@/components/shell/footer";
import { SkipLink } from "@/components/shell/page";
import { TopBar } from "@/components/shell/top-bar";
import { PersonLink } from "@/components/account/person-link";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";
import { signOut } from "./sign-out";

const NAV = [{ href: routes.moves(), label: "Moves" }, { href: routes.companies(), label: "Companies" }, { href: routes.account(), label: "Account" }];
const ADMIN = { href: routes.admin(), label: "Administration" };

/** The bar around everything behind sign-in. Each page still asks for itself who may see it. */
export default async function DeskLayout({ children }: { children: ReactNode }) {
  const viewer = await getViewer();
  if (!viewer) redirect(routes.signIn((await headers()).get("x-path") ?? undefined));
  return (
    <Providers>
      <SkipLink />
      <TopBar homeHref={routes.moves()} nav={viewer.siteAdmin ? [...NAV, ADMIN] : NAV} person={<PersonLink name={viewer.name} companies={viewer.memberships.map((one) => one.companyName)} />}>
        <SignOutButton action={signOut} />
      </TopBar>
      <UploadQueue userId={viewer.userId} />
      {children}
      <Footer />
    </Providers>
  );
}
