import { TZDate } from "@date-fns/tz";

/** Where the zone of a camera's clock comes from: the picture tells it, its GPS does, or neither and the zone of the move's origin is taken. */
export type CapturedFrom = "offset" | "gps" | "origin zone";
export type Captured = { at: Date; from: CapturedFrom };

type Tags = Record<string, unknown>;

const text = (value: unknown) => (typeof value === "string" ? value.trim() : "");

type Wall = [number, number, number, number, number, number];

/** `2026:11:24 14:05:33`, as EXIF writes it (from memory); null for zeros, blanks and days that do not exist. */
function wallOf(value: unknown): Wall | null {
  const found = /^(\d{4})[:-](\d\d)[:-](\d\d)[ T](\d\d):(\d\d):(\d\d)/.exec(text(value));
  if (!found) return null;
  const wall = found.slice(1, 7).map(Number) as Wall;
  const [year, month, day, hour, minute, second] = wall;
  const back = new Date(Date.UTC(year, month - 1, day, hour, minute, second));
  return year >= 1990 && back.getUTCMonth() === month - 1 && back.getUTCDate() === day && back.getUTCHours() === hour ? wall : null;
}

const utc = ([year, month, day, hour, minute, second]: Wall) => Date.UTC(year, month - 1, day, hour, minute, second);

function offsetMinutes(value: unknown): number | null {
  if (text(value) === "Z") return 0;
  const found = /^([+-])(\d\d):?(\d\d)$/.exec(text(value));
  if (!found) return null;
  const minutes = Number(found[2]) * 60 + Number(found[3]);
  return minutes <= 14 * 60 ? (found[1] === "-" ? -minutes : minutes) : null;
}

/** GPS date and time are in UTC. */
function gpsTime(tags: Tags): number | null {
  const time = tags.GPSTimeStamp;
  const clock = Array.isArray(time) ? time.slice(0, 3).map((part) => String(Math.floor(Number(part))).padStart(2, "0")).join(":") : text(time);
  const wall = wallOf(`${text(tags.GPSDateStamp)} ${clock}`);
  return wall && utc(wall);
}

/** When a picture was taken, as it tells itself; null when it tells nothing. */
export function capturedOf(tags: Tags, originZone: string): Captured | null {
  const wall = wallOf(tags.DateTimeOriginal) ?? wallOf(tags.CreateDate);
  const gps = gpsTime(tags);
  if (!wall) return gps === null ? null : { at: new Date(gps), from: "gps" };
  const offset = offsetMinutes(tags.OffsetTimeOriginal) ?? offsetMinutes(tags.OffsetTimeDigitized) ?? offsetMinutes(tags.OffsetTime);
  if (offset !== null) return { at: new Date(utc(wall) - offset * 60_000), from: "offset" };
  if (gps !== null) return { at: new Date(gps), from: "gps" };
  const [year, month, day, hour, minute, second] = wall;
  return { at: new Date(new TZDate(year, month - 1, day, hour, minute, second, originZone).getTime()), from: "origin zone" };
}

/** Latitude and longitude in degrees, or null. */
export function placeOf({ latitude, longitude }: Tags): { latitude: number; longitude: number } | null {
  if (typeof latitude !== "number" || typeof longitude !== "number") return null;
  if (!(Math.abs(latitude) <= 90) || !(Math.abs(longitude) <= 180)) return null;
  return { latitude, longitude };
}

// Anything but letters, marks, digits, punctuation, symbols and spaces.
const UNFIT = /[^\p{L}\p{M}\p{N}\p{P}\p{S} ]/gu;

/** Maker and model in one line; many cameras write the maker into the model too. */
export function cameraOf(tags: Tags): string | null {
  const [make, model] = [tags.Make, tags.Model].map((part) => text(part).replace(UNFIT, "").normalize("NFC").trim()) as [string, string];
  const whole = model.toLowerCase().startsWith(make.toLowerCase()) ? model : `${make} ${model}`;
  return whole.trim().slice(0, 200) || null;
}
