"use client";

import { FrontPage } from "@/components/front/front-page";
import { Button } from "@/components/ui/button";
import { TextLink } from "@/components/ui/link-button";
import { routes } from "@/lib/routes";

/** Stands in place of a page that could not be shown; what went wrong is in the server's log, under the number where there is one. */
export default function PageFault({ error, retry }: { error: unknown; retry: () => void }) {
  const digest = typeof error === "object" && error !== null && "digest" in error ? String(error.digest) : null;
  return (
    <>
      <title>Not shown · Towfolio</title>
      <FrontPage title="This page could not be shown" lead="Nothing that was saved is lost. Mostly it works again in a moment." aside={digest && <p>If it stays so, tell who runs this server: fault <span className="figure">{digest}</span>.</p>}>
        <div className="flex flex-wrap items-center gap-x-5 gap-y-3">
          <Button onClick={retry}>Try again</Button>
          <TextLink href={routes.moves()}>To your moves</TextLink>
        </div>
      </FrontPage>
    </>
  );
}
