import type { Metadata } from "next";
import { TokenForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";
import { enter } from "./actions";

export const metadata: Metadata = { title: "Sign in" };

export default async function EnterPage({ params }: { params: Promise<{ token: string }> }) {
  return (
    <FrontPage title="Sign in on this device" lead="The link works once, within 10 minutes of being asked for." aside={<p>Too late? <TextLink href={routes.signInLink()}>Have a new link mailed</TextLink></p>}>
      <TokenForm action={enter} token={(await params).token} label="Sign in" />
    </FrontPage>
  );
}
