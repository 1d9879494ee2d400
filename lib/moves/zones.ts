/** Zones of North American railroads, by the names people use there. */
export const NORTH_AMERICAN_ZONES: readonly { value: string; label: string }[] = [
  { value: "America/New_York", label: "Eastern" },
  { value: "America/Chicago", label: "Central" },
  { value: "America/Denver", label: "Mountain" },
  { value: "America/Phoenix", label: "Mountain, Arizona (no daylight time)" },
  { value: "America/Los_Angeles", label: "Pacific" },
  { value: "America/Anchorage", label: "Alaska" },
  { value: "America/St_Johns", label: "Newfoundland" },
  { value: "America/Halifax", label: "Atlantic" },
  { value: "America/Toronto", label: "Eastern, Canada" },
  { value: "America/Winnipeg", label: "Central, Canada" },
  { value: "America/Regina", label: "Saskatchewan (no daylight time)" },
  { value: "America/Edmonton", label: "Mountain, Canada" },
  { value: "America/Vancouver", label: "Pacific, Canada" },
  { value: "America/Monterrey", label: "Central, Mexico" },
  { value: "America/Hermosillo", label: "Sonora (no daylight time)" },
];

/** A zone as people call it, or its own name. */
export const zoneLabel = (zone: string) => NORTH_AMERICAN_ZONES.find((one) => one.value === zone)?.label ?? zone.replaceAll("_", " ");
