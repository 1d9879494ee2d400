"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";

/** Reads the page anew from time to time while it is looked at. Unlike a page that reloads itself it keeps place and focus, and a screen reader is not thrown back to the top. */
export function ReadAgain({ seconds }: { seconds: number }) {
  const router = useRouter();
  useEffect(() => {
    const timer = setInterval(() => {
      if (document.visibilityState === "visible") router.refresh();
    }, seconds * 1000);
    return () => clearInterval(timer);
  }, [router, seconds]);
  return null;
}
