import { Button } from "@/components/ui/button";
import { Notice } from "@/components/ui/notice";

type SignedInAsOtherProps = { name: string; email: string; letterEmail: string; action: () => Promise<void> };

/** The browser is somebody else's just now; joining would mix up two people. */
export function SignedInAsOther({ name, email, letterEmail, action }: SignedInAsOtherProps) {
  return (
    <Notice title={`You are signed in as ${name}`}>
      <p>That account has the address {email}, and this letter is for {letterEmail}. If the letter is yours, sign out and go on; if not, hand it on to whom it is for.</p>
      <form action={action} className="mt-3">
        <Button type="submit" variant="ghost">Sign out and go on</Button>
      </form>
    </Notice>
  );
}
