import Link from "next/link";
import { type ReactNode } from "react";
import { NavLinks, type NavItem } from "./nav-links";
import { PhoneMenu } from "./phone-menu";
import { WordMark } from "./word-mark";

export type TopBarProps = {
  homeHref: string;
  /** Empty before sign-in. */
  nav: readonly NavItem[];
  /** Who is signed in, for which company. */
  person?: ReactNode;
  /** The sign-out button, or a way to sign in; its colours come from the bar. */
  children?: ReactNode;
};

/** The bar at the top of every page: sign, places, who you are. On a phone the places go into a menu. */
export function TopBar({ homeHref, nav, person, children }: TopBarProps) {
  const hasMenu = nav.length > 0 || Boolean(person);
  return (
    <header data-bar="" className="relative border-b border-bar-ink-2/25 bg-bar text-bar-ink [--focus:var(--bar-line)]">
      <div className="mx-auto flex h-13 items-center gap-7 px-4 sm:px-8">
        <Link href={homeHref} className="inline-flex min-h-11 items-center">
          <WordMark />
        </Link>
        {nav.length > 0 && (
          <nav aria-label="Main" className="hidden sm:block">
            <NavLinks items={nav} />
          </nav>
        )}
        <div className={hasMenu ? "ml-auto hidden items-center gap-5 text-14 text-bar-ink-2 sm:flex" : "ml-auto flex items-center gap-5 text-14"}>
          {person}
          {children}
        </div>
        {hasMenu && (
          <div className="ml-auto sm:hidden">
            <PhoneMenu>
              {nav.length > 0 && (
                <nav aria-label="Main">
                  <NavLinks items={nav} tall />
                </nav>
              )}
              <div className="mt-3 flex min-h-11 flex-wrap items-center justify-between gap-x-5 gap-y-2 text-15 text-bar-ink-2">
                {person}
                {children}
              </div>
            </PhoneMenu>
          </div>
        )}
      </div>
    </header>
  );
}

/** The bar of a field screen on a phone: back to where it came from, and how far along it is. Elsewhere it does not show. */
export function FieldBar({ backHref, backLabel, note }: { backHref: string; backLabel: ReactNode; note?: ReactNode }) {
  return (
    <div data-bar="" className="flex h-13 items-center justify-between gap-4 bg-bar px-4 text-bar-ink [--focus:var(--bar-line)] sm:hidden">
      <Link href={backHref} className="inline-flex min-h-11 items-center gap-2 font-[640]">
        <svg aria-hidden="true" width="8" height="12" viewBox="0 0 8 12">
          <path d="M6.5 1l-5 5 5 5" fill="none" stroke="currentColor" strokeWidth="2" />
        </svg>
        {backLabel}
      </Link>
      {note && <span className="figure text-bar-ink-2">{note}</span>}
    </div>
  );
}
