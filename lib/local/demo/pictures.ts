import sharp from "sharp";

/** Pictures drawn for the demo, in place of photographs. A measured one shows a rule at `pxPerIn`, so that its length in the picture is the case's figure. */
export type Picture = { name: string; alt: string; svg: string };

const W = 1600;
const H = 1200;
const IN = 80;

const SEGMENTS: Record<string, string> = { "0": "abcdef", "1": "bc", "2": "abged", "3": "abgcd", "4": "fgbc", "5": "afgcd", "6": "afgedc", "7": "abc", "8": "abcdefg", "9": "abfgcd" };
const LINES: Record<string, [number, number, number, number]> = { a: [0, 0, 10, 0], b: [10, 0, 10, 10], c: [10, 10, 10, 20], d: [0, 20, 10, 20], e: [0, 10, 0, 20], f: [0, 0, 0, 10], g: [0, 10, 10, 10] };

/** Figures as strokes: the machine that draws may have no fonts. */
function figure(text: string, x: number, y: number, size = 1): string {
  return [...text].map((char, index) => [...(SEGMENTS[char] ?? "")].map((name) => {
    const [x1, y1, x2, y2] = LINES[name] ?? [0, 0, 0, 0];
    const left = x + index * 16 * size;
    return `<path d="M${left + x1 * size} ${y + y1 * size}L${left + x2 * size} ${y + y2 * size}"/>`;
  }).join("")).join("");
}

/** A steel rule of whole inches, with eighths; its zero at `x`. */
function rule(x: number, y: number, inches: number): string {
  const ticks = Array.from({ length: inches * 8 + 1 }, (_, n) => {
    const height = n % 8 === 0 ? 46 : n % 4 === 0 ? 32 : n % 2 === 0 ? 22 : 14;
    return `M${x + (n * IN) / 8} ${y}v${height}`;
  }).join("");
  const numbers = Array.from({ length: inches }, (_, n) => figure(String(n + 1), x + (n + 1) * IN - 22 - (n > 8 ? 14 : 0), y + 50, 1.3)).join("");
  return `<rect x="${x - 14}" y="${y - 6}" width="${inches * IN + 28}" height="92" fill="#cfd2cf"/><path d="${ticks}" stroke="#22262a" stroke-width="2.4"/><g stroke="#22262a" stroke-width="3.4" fill="none">${numbers}</g>`;
}

const scene = (inside: string, sky = "#8f9a9c") => `<svg xmlns="http://www.w3.org/2000/svg" width="${W}" height="${H}" viewBox="0 0 ${W} ${H}"><rect width="${W}" height="${H}" fill="${sky}"/><path d="M0 980h${W}v220H0z" fill="#5c564b"/>${inside}</svg>`;

/** The jaw of a coupler: the gap from knuckle to guard arm in eighths of an inch, with a rule held in the plane. */
export function couplerGap(name: string, alt: string, eighths: number): Picture {
  const gap = (eighths * IN) / 8;
  const left = 520;
  const body = `<path d="M120 260c160-60 300-30 ${left - 120} 60v360c-120 90-280 110-${left - 120} 40z" fill="#6b655c"/><path d="M${left + gap} 300c120-70 320-60 440 20v380c-140 80-320 80-440-10z" fill="#7b756b"/><path d="M160 330c90-30 180-20 270 20" stroke="#88827a" stroke-width="10" fill="none"/>`;
  return { name, alt, svg: scene(`${body}${rule(left, 800, 12)}<path d="M${left} 740v60M${left + gap} 740v60" stroke="#e9c94f" stroke-width="4"/>`, "#3f4144") };
}

/** A wheel's tread from the side with a flat, its length along the tread in eighths of an inch. */
export function flatSpot(name: string, alt: string, eighths: number): Picture {
  const length = (eighths * IN) / 8;
  const left = 800 - length / 2;
  return { name, alt, svg: scene(`<path d="M0 0h1600v620c-300 130-560 170-${1600 - left - length} 178h-${length}C540 800 250 740 0 620z" fill="#6f6a63"/><path d="M${left} 798h${length}" stroke="#c9c4ba" stroke-width="12"/>${rule(left, 820, 8)}`, "#2f3133") };
}

const tag = (x: number, y: number, text: string) => `<path d="M${x} ${y}h190l40 60-40 60H${x}z" fill="#b9412a"/><circle cx="${x + 196}" cy="${y + 60}" r="12" fill="#2c2f31"/><g stroke="#fff" stroke-width="6" fill="none">${figure(text, x + 30, y + 40, 2)}</g>`;

/** The unit from the side, as it stands. */
export const overview = (name: string, alt: string): Picture => ({ name, alt, svg: scene(`<path d="M140 900V640h60V520h230V380h150v70h820v120h60v330z" fill="#39424a"/><path d="M260 430h70v80h-70zM450 420h90v70h-90z" fill="#b7c4c9"/><path d="M640 400h90v50h-90zM980 400h90v50h-90z" fill="#b9412a"/><g fill="#1d2124">${[320, 440, 560, 1040, 1160, 1280].map((x) => `<circle cx="${x}" cy="930" r="52"/>`).join("")}</g><path d="M0 986h1600" stroke="#2a2d2f" stroke-width="16"/>`) });
export const stackCap = (name: string, alt: string): Picture => ({ name, alt, svg: scene(`<path d="M200 700h1200v300H200z" fill="#4a5258"/><path d="M560 420h480v300H560z" fill="#3a4146"/><path d="M520 360h560v90H520z" fill="#c9b458"/><path d="M540 440l40 240M1060 440l-40 240" stroke="#d8d5cc" stroke-width="12"/>`) });
export const batterySwitch = (name: string, alt: string, tagNumber: string): Picture => ({ name, alt, svg: scene(`<path d="M300 160h1000v860H300z" fill="#565f64"/><path d="M560 300h480v420H560z" fill="#2f3437"/><path d="M700 680l-160-320" stroke="#c98f3c" stroke-width="46"/><circle cx="700" cy="690" r="40" fill="#c98f3c"/>${tag(900, 780, tagNumber)}`, "#474d50") });
export const handlesOff = (name: string, alt: string): Picture => ({ name, alt, svg: scene(`<path d="M220 240h1160v780H220z" fill="#5b6469"/><circle cx="560" cy="520" r="120" fill="#343a3e"/><circle cx="560" cy="520" r="34" fill="#b5babb"/><circle cx="1020" cy="520" r="120" fill="#343a3e"/><circle cx="1020" cy="520" r="34" fill="#b5babb"/><path d="M420 860h300v40H420zM900 860h260v40H900z" fill="#c9c4b4"/>`, "#3d4245") });
export const chain = (name: string, alt: string): Picture => ({ name, alt, svg: scene(`<path d="M0 120h1600v160H0z" fill="#4b5156"/><g fill="none" stroke="#8c867a" stroke-width="22">${Array.from({ length: 9 }, (_, n) => `<ellipse cx="${260 + n * 130}" cy="${420 + Math.round(120 * Math.sin((n / 8) * Math.PI))}" rx="76" ry="38"/>`).join("")}</g>`, "#6d7375") });
export const chocks = (name: string, alt: string): Picture => ({ name, alt, svg: scene(`<circle cx="800" cy="620" r="330" fill="#4c4f50"/><circle cx="800" cy="620" r="110" fill="#33373a"/><path d="M360 980l170-210 60 210zM1240 980l-170-210-60 210z" fill="#d0a13a"/><path d="M0 986h1600" stroke="#2a2d2f" stroke-width="18"/>`) });

const two = (n: number) => String(n).padStart(2, "0");

/** The picture as a JPEG, with the time at which it is said to have been taken. */
export async function photograph({ svg }: Picture, at: Date): Promise<Uint8Array<ArrayBuffer>> {
  const taken = `${at.getUTCFullYear()}:${two(at.getUTCMonth() + 1)}:${two(at.getUTCDate())} ${two(at.getUTCHours())}:${two(at.getUTCMinutes())}:00`;
  const bytes = await sharp(Buffer.from(svg)).withExif({ IFD0: { Make: "Demo", Model: "Drawn for the demo" }, IFD2: { DateTimeOriginal: taken, OffsetTimeOriginal: "+00:00" } }).jpeg({ quality: 84 }).toBuffer();
  return Uint8Array.from(bytes);
}

export const PICTURE_SIZE = { widthPx: W, heightPx: H } as const;
