/** Restrictions an inspector can put on an acceptance. `code` is X12 element 152 (special handling) where one exists in the published part. */
export const RESTRICTIONS = [
  { id: "mph-15", label: "15 mph at most", code: "15" },
  { id: "mph-25", label: "25 mph at most", code: "25" },
  { id: "mph-35", label: "35 mph at most", code: "35" },
  { id: "mph-45", label: "45 mph at most", code: "45" },
  { id: "do-not-hump", label: "Do not hump", code: null },
  { id: "head-end", label: "Head end of the train", code: "HE" },
  { id: "rear", label: "Rear of the train", code: null },
  { id: "do-not-uncouple", label: "Do not uncouple", code: "DU" },
  { id: "notify-bad-order", label: "If bad-ordered, notify the shipper", code: "BN" },
  { id: "face-a", label: "Face A end to head of train", code: "FA" },
  { id: "face-b", label: "Face B end to head of train", code: "FB" },
  { id: "high-wide", label: "High-wide", code: "HW" },
] as const;
export type RestrictionId = (typeof RESTRICTIONS)[number]["id"];
export const RESTRICTION_IDS = RESTRICTIONS.map((one) => one.id) as unknown as readonly [RestrictionId, ...RestrictionId[]];
