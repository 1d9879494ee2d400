import type { Metadata } from "next";
import { MailMeForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { mailSignInLink } from "@/app/(front)/sign-in/actions";

export const metadata: Metadata = { title: "Sign in by mail" };

export default function SignInLinkPage() {
  return (
    <FrontPage title="Sign in by mail" lead="We mail a link to the address of your account. It works once, within 10 minutes." aside={<p><TextLink href={routes.signIn()}>Sign in with a password</TextLink></p>}>
      <MailMeForm action={mailSignInLink} label="Mail me the link" />
    </FrontPage>
  );
}
