import type { Metadata } from "next";
import { MailMeForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { Disclosure } from "@/components/ui/disclosure";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { mailAgain } from "./actions";

export const metadata: Metadata = { title: "Check your mail" };

const WORDS: Record<string, string> = {
  "sign-in": "If an account has this address, a sign-in link is on its way. It works once, within 10 minutes.",
  reset: "If an account has this address, a link for a new password is on its way. It works once, within 10 minutes.",
  again: "If this address still waits to be checked, the link is on its way again.",
};
const FIRST = "A link is on its way to the address that you gave. Open it and press its button; then we know that the address is yours, and you are signed in.";

type Props = { searchParams: Promise<{ after?: string | string[] }> };

export default async function CheckMailPage({ searchParams }: Props) {
  const { after } = await searchParams;
  const words = typeof after === "string" ? WORDS[after] : undefined;
  return (
    <FrontPage title="Check your mail" lead={words ?? FIRST} aside={<p><TextLink href={routes.signIn()}>Back to sign in</TextLink></p>}>
      <p className="text-15">The mail comes within a minute or two. If it doesn’t, look among the unwanted mail, and see that the address was right.</p>
      {!words && (
        <Disclosure className="mt-5" summary="Send the link again">
          <MailMeForm action={mailAgain} label="Send it again" />
        </Disclosure>
      )}
    </FrontPage>
  );
}
