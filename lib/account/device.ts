const BROWSERS: [RegExp, string][] = [[/Edg(?:e|A|iOS)?\//, "Edge"], [/OPR\/|Opera/, "Opera"], [/SamsungBrowser\//, "Samsung Internet"], [/Firefox\/|FxiOS\//, "Firefox"], [/Chrom(?:e|ium)\/|CriOS\//, "Chrome"], [/Safari\//, "Safari"]];
// A phone's text names the desktop system that it descends from too, so the narrower names come first.
const SYSTEMS: [RegExp, string][] = [[/iPhone/, "iPhone"], [/iPad/, "iPad"], [/Android/, "Android"], [/CrOS/, "Chromebook"], [/Windows/, "Windows"], [/Macintosh|Mac OS X/, "Mac"], [/Linux|X11/, "Linux"]];

const nameIn = (list: [RegExp, string][], text: string) => list.find(([pattern]) => pattern.test(text))?.[1];

/** A browser's own description in words: "Firefox on Windows". */
export function deviceOf(userAgent: string | null): string {
  const text = userAgent ?? "";
  const browser = nameIn(BROWSERS, text);
  const system = nameIn(SYSTEMS, text);
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? (system ? `A browser on ${system}` : "Unknown browser");
}
