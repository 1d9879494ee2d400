/** Least and most that the payment service takes at once in US dollars, in cents; both from memory of its published limits. */
export const LEAST_CENTS = 50;
export const MOST_CENTS = 99_999_999;

export type ReadMoney = { cents: number; fault: null } | { cents: null; fault: string };

const PLAIN = /^\d+(\.\d\d)?$/;
const GROUPED = /^\d{1,3}(,\d{3})+(\.\d\d)?$/;
const LONGEST = 20;

const fault = (words: string): ReadMoney => ({ cents: null, fault: words });

/** What keeps a text from being an amount, in words that help to correct it. */
function faultOf(text: string): string {
  if (/^-|^\(.*\)$/.test(text)) return "Enter an amount above zero.";
  if (/^\d[\d.]*,\d\d?$/.test(text)) return "Write cents after a point: 4,185.00.";
  if (/^[\d,]*\.(\d|\d{3,})?$/.test(text)) return "Write cents with two digits: 4,185.50.";
  if (/^[\d,.]+$/.test(text)) return "A comma stands before every three digits, or nowhere: 4,185.00 or 4185.";
  return "Enter an amount such as 4,185.00.";
}

/** Reads an amount in dollars as typed into exact cents; nothing is rounded or guessed. A leading dollar sign may stay. */
export function readMoney(typed: string): ReadMoney {
  const text = typed.trim().replace(/^\$\s?/, "");
  if (text === "") return fault("Enter an amount.");
  if (text.length > LONGEST) return fault("At most $999,999.99.");
  if (!PLAIN.test(text) && !GROUPED.test(text)) return fault(faultOf(text));
  const [dollars = "", cents = "00"] = text.replaceAll(",", "").split(".");
  const read = Number(dollars) * 100 + Number(cents);
  if (read === 0) return fault("Enter an amount above zero.");
  return read > MOST_CENTS ? fault("At most $999,999.99.") : { cents: read, fault: null };
}

/** Cents as `$4,185.00`; a negative amount as `−$4,185.00`. */
export function formatMoney(cents: number): string {
  const size = Math.abs(cents);
  const dollars = String(Math.floor(size / 100)).replaceAll(/\B(?=(\d{3})+$)/g, ",");
  return `${cents < 0 ? "−" : ""}$${dollars}.${String(size % 100).padStart(2, "0")}`;
}

export const sumCents = (lines: readonly { amountCents: number }[]) => lines.reduce((total, line) => total + line.amountCents, 0);
