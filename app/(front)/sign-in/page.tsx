import type { Metadata } from "next";
import { redirect } from "next/navigation";
import { FrontPage } from "@/components/front/front-page";
import { SignInForm } from "@/components/front/front-forms";
import { TextLink } from "@/components/ui/link-button";
import { Notice } from "@/components/ui/notice";
import { routes } from "@/lib/routes";
import { safeNext } from "@/lib/viewer/next-path";
import { getViewer } from "@/lib/viewer/viewer";
import { signIn } from "./actions";

export const metadata: Metadata = { title: "Sign in" };

type Props = { searchParams: Promise<{ next?: string | string[]; after?: string | string[] }> };

export default async function SignInPage({ searchParams }: Props) {
  const { next, after } = await searchParams;
  const path = safeNext(typeof next === "string" ? next : null);
  if (await getViewer()) redirect(path ?? routes.moves());
  return (
    <FrontPage
      title="Sign in"
      lead="For the people who move a locomotive dead in tow: owners, contractors, carriers, receivers and payers."
      aside={
        <>
          <p><TextLink href={routes.signInLink()}>Have a sign-in link mailed instead</TextLink>, good for 10 minutes.</p>
          <p><TextLink href={routes.forgotPassword()}>Forgot the password</TextLink></p>
          <p>No account yet? <TextLink href={routes.signUp()}>Make one</TextLink>. If somebody invited you to a move, open the link in that mail; it needs no account.</p>
        </>
      }
    >
      {after === "reset" && <Notice kind="done" live="status" className="mb-5">The password is changed and every session has ended. Sign in with the new one.</Notice>}
      <SignInForm action={signIn} next={path ?? ""} />
    </FrontPage>
  );
}
