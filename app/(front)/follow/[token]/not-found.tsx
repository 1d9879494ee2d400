import { Page } from "@/components/shell/page";

/** The same words for a link that never was, was ended, or has run out. */
export default function NoSuchLink() {
  return (
    <Page width="form">
      <h1 className="text-28 font-[720] tracking-[-0.015em]">This link leads nowhere</h1>
      <p className="mt-2 max-w-[60ch]">It may have run out, been ended, or been cut short on its way to you. Ask whoever sent it for a new one.</p>
    </Page>
  );
}
