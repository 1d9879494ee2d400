import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { Page } from "@/components/shell/page";
import { FollowPage } from "@/components/timeline/follow-page";
import { ReadAgain } from "@/components/timeline/read-again";
import { callerAddress } from "@/lib/entry/address";
import { AppError } from "@/lib/errors";
import { unsafeOpenFollow } from "@/lib/timeline/commands";

/** Alike for every link, so that a title gives nothing away. */
export const metadata: Metadata = { title: "Follow a move", robots: { index: false, follow: false, noarchive: true } };

const REFRESH_SECONDS = 60;

/** Null for a link that is not good; a caller who asks too often gets the words of the limit. */
async function open(token: string) {
  try {
    return await unsafeOpenFollow(token, await callerAddress(), new Date());
  } catch (error) {
    if (error instanceof AppError && error.code === "too_many") return error.message;
    throw error;
  }
}

/** A move as a notify party follows it, without an account. */
export default async function FollowByLink({ params }: { params: Promise<{ token: string }> }) {
  const view = await open((await params).token);
  if (view === null) notFound();
  if (typeof view === "string") {
    return (
      <Page width="form">
        <h1 className="text-28 font-[720]">Wait a moment</h1>
        <p className="mt-2">{view}</p>
      </Page>
    );
  }
  return (
    <Page>
      <ReadAgain seconds={REFRESH_SECONDS} />
      <FollowPage view={view} />
    </Page>
  );
}
