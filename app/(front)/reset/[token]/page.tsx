import type { Metadata } from "next";
import { ResetForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { resetPassword } from "./actions";

export const metadata: Metadata = { title: "New password" };

export default async function ResetPage({ params }: { params: Promise<{ token: string }> }) {
  return (
    <FrontPage title="New password" lead="Every session ends when it is set, also on other devices." aside={<p>The link is too old? <TextLink href={routes.forgotPassword()}>Have a new one mailed</TextLink></p>}>
      <ResetForm action={resetPassword} token={(await params).token} />
    </FrontPage>
  );
}
