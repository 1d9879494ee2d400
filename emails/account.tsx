import type { MailPayloads } from "@/lib/outbox/types";
import { Action, Letter, Para } from "./layout";

export function VerifyAddressEmail({ name, url }: MailPayloads["verify-address"]) {
  return (
    <Letter preview="One step to finish signing up" title="Is this your address?">
      <Para>{name}, open the page below and press the button there, so that we know this address is yours.</Para>
      <Action url={url} label="Check my address" />
      <Para>The link is good for a day. If you did not sign up, do nothing; without the button no account can be used.</Para>
    </Letter>
  );
}

export function SignInLinkEmail({ url }: MailPayloads["sign-in-link"]) {
  return (
    <Letter preview="Good for ten minutes, once" title="Sign in to Towfolio">
      <Para>Open the page below and press the button there. The link is good for ten minutes and works once.</Para>
      <Action url={url} label="Sign in" />
      <Para>If you did not ask for it, do nothing.</Para>
    </Letter>
  );
}

export function ResetPasswordEmail({ name, url }: MailPayloads["reset-password"]) {
  return (
    <Letter preview="Good for ten minutes, once" title="Choose a new password">
      <Para>{name}, the page below takes a new password. The link is good for ten minutes and works once. All sessions end when the password changes.</Para>
      <Action url={url} label="Choose a password" />
      <Para>If you did not ask for it, do nothing; your password stays.</Para>
    </Letter>
  );
}

export function PasswordChangedEmail({ name }: MailPayloads["password-changed"]) {
  return (
    <Letter preview="Your password was changed" title="Your password was changed">
      <Para>{name}, the password of your account was changed just now and your other sessions have ended.</Para>
      <Para>If it was not you, ask for a new password on the sign-in page at once.</Para>
    </Letter>
  );
}

export function FollowLinkEmail({ unit, from, to, url }: MailPayloads["follow-link"]) {
  return (
    <Letter preview={`Follow ${unit} from ${from} to ${to}`} title={`Follow the move of ${unit}`}>
      <Para>The unit goes from {from} to {to}, dead in tow. The page below shows where it was seen. It needs no account; whoever holds the link sees the same, so pass it on with care.</Para>
      <Action url={url} label="Follow the move" />
    </Letter>
  );
}
