import { describe, expect, it } from "vitest";
import { cameraOf, capturedOf, placeOf } from "@/lib/evidence/captured";

const ZONE = "America/Chicago";

describe("when a picture was taken", () => {
  it.each([
    ["with its offset", { DateTimeOriginal: "2026:11:24 14:05:33", OffsetTimeOriginal: "-07:00" }, "2026-11-24T21:05:33.000Z", "offset"],
    ["with an offset of a quarter", { DateTimeOriginal: "2026:11:24 14:05:33", OffsetTime: "+05:45" }, "2026-11-24T08:20:33.000Z", "offset"],
    ["by its GPS", { DateTimeOriginal: "2026:11:24 14:05:33", GPSDateStamp: "2026:11:24", GPSTimeStamp: [20, 5, 31.4] }, "2026-11-24T20:05:31.000Z", "gps"],
    ["by the zone of the move's origin", { DateTimeOriginal: "2026:11:24 14:05:33" }, "2026-11-24T20:05:33.000Z", "origin zone"],
    ["in summer", { DateTimeOriginal: "2026:07:24 14:05:33" }, "2026-07-24T19:05:33.000Z", "origin zone"],
    ["by the day it was made into a file", { CreateDate: "2026:11:24 14:05:33", OffsetTimeOriginal: "Z" }, "2026-11-24T14:05:33.000Z", "offset"],
  ])("%s", (_, tags, at, from) => {
    expect(capturedOf(tags, ZONE)).toEqual({ at: new Date(at), from });
  });

  it.each([
    ["nothing", {}],
    ["zeros", { DateTimeOriginal: "0000:00:00 00:00:00" }],
    ["a day that does not exist", { DateTimeOriginal: "2026:02:31 10:00:00" }],
    ["blanks", { DateTimeOriginal: "    :  :     :  :  " }],
    ["a number", { DateTimeOriginal: 20261124 }],
    ["GPS without a day", { GPSTimeStamp: [20, 5, 31] }],
  ])("%s tells nothing", (_, tags) => {
    expect(capturedOf(tags, ZONE)).toBeNull();
  });

  it("an offset that no clock has is not believed", () => {
    expect(capturedOf({ DateTimeOriginal: "2026:11:24 14:05:33", OffsetTimeOriginal: "+99:00" }, ZONE)?.from).toBe("origin zone");
  });
});

it("place within the globe, or none", () => {
  expect(placeOf({ latitude: 41.5, longitude: -96.25 })).toEqual({ latitude: 41.5, longitude: -96.25 });
  for (const tags of [{}, { latitude: Number.NaN, longitude: 1 }, { latitude: 91, longitude: 0 }, { latitude: "41", longitude: "1" }]) expect(placeOf(tags)).toBeNull();
});

it("camera in one line, without what can't be shown", () => {
  expect(cameraOf({ Make: "Ardell", Model: "P4" })).toBe("Ardell P4");
  expect(cameraOf({ Make: "ARDELL", Model: "Ardell P4\0\0" })).toBe("Ardell P4");
  expect(cameraOf({ Model: "P4\u202E" })).toBe("P4");
  expect(cameraOf({ Make: "x".repeat(300) })).toHaveLength(200);
  expect(cameraOf({})).toBeNull();
});
