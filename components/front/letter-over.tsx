import { TextLink } from "@/components/ui/link-button";
import { INVITATION_OVER } from "@/lib/parties/vocabulary";
import { routes } from "@/lib/routes";
import { FrontPage } from "./front-page";

/** A letter that was used, taken back, is too old or never was: all look alike. */
export function LetterOver() {
  return (
    <FrontPage title={INVITATION_OVER} lead="Letters work once and for 14 days. Ask whoever invited you, mostly the owner of the locomotive, to send a new one.">
      <p className="text-15">Joined already? <TextLink href={routes.signInLink()}>Have a sign-in link mailed</TextLink> or <TextLink href={routes.signIn()}>sign in with your password</TextLink>.</p>
    </FrontPage>
  );
}
