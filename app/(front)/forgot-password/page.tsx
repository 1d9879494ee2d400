import type { Metadata } from "next";
import { MailMeForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";
import { mailReset } from "./actions";

export const metadata: Metadata = { title: "New password" };

export default async function ForgotPasswordPage() {
  const viewer = await getViewer();
  return (
    <FrontPage title="New password" lead="We mail a link to the address of your account, by which you set a new password. Every session ends then, also on other devices." aside={<p><TextLink href={routes.signIn()}>Back to sign in</TextLink></p>}>
      <MailMeForm action={mailReset} label="Mail me the link" email={viewer?.email ?? ""} />
    </FrontPage>
  );
}
