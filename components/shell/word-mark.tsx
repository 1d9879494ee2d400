/** The sign of the product: a unit on its track. */
export function WordMark() {
  return (
    <span className="inline-flex items-center gap-2.5 text-[19px] leading-none font-[740] tracking-[-0.01em] [font-stretch:112%]">
      <svg aria-hidden="true" width="26" height="20" viewBox="0 0 26 20">
        <path d="M1 16h24M4 16v-3M10 16v-3M16 16v-3M22 16v-3" strokeWidth="2" fill="none" className="stroke-bar-line" />
        <path d="M4 2h12.5l5 4.75-5 4.75H4z" fill="none" stroke="currentColor" strokeWidth="2" />
        <circle cx="16" cy="6.75" r="1.5" fill="currentColor" />
      </svg>
      Towfolio
    </span>
  );
}
