"use client";

import { clsx } from "clsx";
import Link from "next/link";
import { usePathname } from "next/navigation";

export type NavItem = { href: string; label: string };

const within = (path: string, href: string) => path === href || path.startsWith(`${href}/`);

/** The main places, the one that you are in underlined; `tall` is the list in a phone's menu. */
export function NavLinks({ items, tall = false }: { items: readonly NavItem[]; tall?: boolean }) {
  const path = usePathname();
  // A place may lie within another; the innermost is where one is.
  const inner = items.filter(({ href }) => within(path, href)).sort((one, two) => two.href.length - one.href.length)[0];
  return (
    <ul className={tall ? "divide-y divide-bar-ink-2/30" : "flex gap-5"}>
      {items.map(({ href, label }) => {
        const here = href === inner?.href;
        return (
          <li key={href}>
            <Link
              href={href}
              aria-current={here ? "page" : undefined}
              className={clsx(
                "flex items-center hover:text-bar-ink",
                tall ? "min-h-13 text-17" : "h-13 border-y-[3px] border-transparent text-14",
                here ? "text-bar-ink font-[620]" : "text-bar-ink-2",
                here && (tall ? "underline decoration-bar-line decoration-3 underline-offset-6" : "border-b-bar-line"),
              )}
            >
              {label}
            </Link>
          </li>
        );
      })}
    </ul>
  );
}
