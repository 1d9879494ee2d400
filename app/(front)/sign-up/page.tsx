import type { Metadata } from "next";
import { SignUpForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { signUp } from "./actions";

export const metadata: Metadata = { title: "Make an account" };

export default function SignUpPage() {
  return (
    <FrontPage
      title="Make an account"
      lead="For whoever opens moves: the owner of a locomotive, or who acts for one. People of other companies are invited to a move and need no account first."
      aside={<p>You have one already? <TextLink href={routes.signIn()}>Sign in</TextLink></p>}
    >
      <SignUpForm action={signUp} />
    </FrontPage>
  );
}
