import type { Metadata } from "next";
import { randomUUID } from "node:crypto";
import { signOutTo } from "@/app/(front)/sign-out-to";
import { JoinForm } from "@/components/front/join-form";
import { FrontPage } from "@/components/front/front-page";
import { LetterOver } from "@/components/front/letter-over";
import { SignedInAsOther } from "@/components/front/signed-in-as-other";
import { Box, BoxGrid } from "@/components/ui/box";
import { unsafeReadLetter } from "@/lib/parties/queries";
import { partLabelOf, worksWords } from "@/lib/parties/words";
import { routes } from "@/lib/routes";
import { getViewer } from "@/lib/viewer/viewer";
import { join } from "./actions";

export const metadata: Metadata = { title: "Invitation" };

/** Says who invites whom to what; opening it changes nothing, the button does. */
export default async function JoinPage({ params }: { params: Promise<{ token: string }> }) {
  const { token } = await params;
  const letter = await unsafeReadLetter(token);
  if (!letter) return <LetterOver />;
  const viewer = await getViewer();
  const other = viewer && viewer.email !== letter.email ? viewer : null;
  return (
    <FrontPage
      title={letter.unit ? `Join the move of ${letter.unit}` : `Join ${letter.companyName}`}
      lead={`${letter.inviterName} of ${letter.inviterCompany} asks you to take part${letter.unit ? "" : " as a colleague"}. This letter is for ${letter.email}.`}
    >
      <BoxGrid className="mb-6">
        {letter.unit && <Box label="From" span={6}>{letter.from}</Box>}
        {letter.unit && <Box label="To" span={6}>{letter.to}</Box>}
        <Box label="Your company" span={6}>{letter.companyName}</Box>
        <Box label="Your part" span={6} detail={[letter.legWords, worksWords(letter)].filter(Boolean).join("; ") || undefined}>{partLabelOf(letter.part)}</Box>
      </BoxGrid>
      {other ? <SignedInAsOther name={other.name} email={other.email} letterEmail={letter.email} action={signOutTo.bind(null, routes.join(token))} /> : <JoinForm action={join} token={token} once={randomUUID()} askName={!letter.nameKnown} unit={letter.unit} />}
    </FrontPage>
  );
}
