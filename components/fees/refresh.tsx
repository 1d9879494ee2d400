"use client";

import { useRouter } from "next/navigation";
import { useEffect } from "react";

const EVERY_MS = 3000;
const MOST_TIMES = 100;

/** Asks the server again every few seconds while this is on the page, for five minutes at most. */
export function Refresh() {
  const router = useRouter();
  useEffect(() => {
    let times = 0;
    const clock = setInterval(() => {
      times += 1;
      if (times >= MOST_TIMES) clearInterval(clock);
      router.refresh();
    }, EVERY_MS);
    return () => clearInterval(clock);
  }, [router]);
  return null;
}
