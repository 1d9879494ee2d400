import type { Metadata } from "next";
import { TokenForm } from "@/components/front/front-forms";
import { FrontPage } from "@/components/front/front-page";
import { verifyAddress } from "./actions";

export const metadata: Metadata = { title: "Check your address" };

export default async function VerifyPage({ params }: { params: Promise<{ token: string }> }) {
  return (
    <FrontPage title="Is this your address?" lead="An account was made with the address that this link was mailed to. If you made it, press the button. If you did not, close this page; without the button the account stays shut.">
      <TokenForm action={verifyAddress} token={(await params).token} label="Yes, I made this account" />
    </FrontPage>
  );
}
