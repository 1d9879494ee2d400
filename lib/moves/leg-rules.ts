import type { Denial } from "@/lib/errors";
import type { LegFacts } from "@/lib/standing/types";

const denied = (message: string): Denial => ({ code: "not_yet", message });

/** A leg's places and miles stand once its carrier has accepted the unit for them. */
export function denyLegEdit(leg: LegFacts): Denial | null {
  if (leg.takenOver) return denied(`${leg.carrierName} has taken the unit over; this leg stays as it is.`);
  if (leg.instructed) return denied(`${leg.carrierName} has given its movement instruction for this leg; it has to be withdrawn first.`);
  if (leg.accepted) return denied(`${leg.carrierName} has accepted the unit for this leg; the acceptance has to be withdrawn first.`);
  return null;
}

/** Another carrier can take a leg only while the first has not begun: what it saw and asked must not stand under another's name. */
export function denyCarrierChange(leg: LegFacts): Denial | null {
  const denial = denyLegEdit(leg);
  if (denial) return denial;
  if (leg.visits > 0 || leg.findings > 0) return denied(`${leg.carrierName} has inspected the unit for this leg; its carrier can’t be replaced any more.`);
  if (leg.quote !== "none" || leg.billingCleared) return denied(`${leg.carrierName} has quoted or cleared the charges of this leg; its carrier can’t be replaced any more.`);
  return null;
}

/** Who pays stands once charges were agreed. */
export function denyPayerChange(leg: LegFacts): Denial | null {
  if (leg.quote === "agreed" || leg.quote === "paid" || leg.paymentOpen) return denied("The charges of this leg are agreed or paid; its payer can’t be changed any more.");
  if (leg.billingCleared) return denied("Billing of this leg is cleared; its payer can’t be changed any more.");
  return null;
}
