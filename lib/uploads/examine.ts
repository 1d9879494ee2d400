import "server-only";
import { spawn } from "node:child_process";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { fileURLToPath } from "node:url";

export type Bounds = { maxPixels: number; maxSidePx: number; seconds: number; memoryMb: number };

/** What a picture says of itself, tag by tag, as it stands there. */
export type PictureTags = Record<string, unknown>;

export type Examined =
  | { ok: true; widthPx: number; heightPx: number; tags: PictureTags; preview: Buffer<ArrayBuffer> }
  | { ok: false; fault: "broken" | "too-many-pixels" | "too-costly" };

const CHILD = fileURLToPath(new URL("./examine-child.mjs", import.meta.url));

/** Address space that the runtime itself reserves without using it; what the picture may take comes on top. */
const RUNTIME_MB = 1400;

/** Opens a picture in a process of its own with a limit on time and memory, and makes a preview without its metadata. However the process ends, this one goes on. */
export async function examinePicture(path: string, bounds: Bounds): Promise<Examined> {
  const folder = await mkdtemp(join(tmpdir(), "towfolio-preview-"));
  const preview = join(folder, "preview.jpg");
  try {
    const ended = await runChild([path, preview, String(bounds.maxPixels), String(bounds.maxSidePx)], bounds);
    // Ended by a signal: too long, too much memory, or a picture that the decoder stumbles over.
    if (ended.signal) return { ok: false, fault: "too-costly" };
    if (ended.code !== 0) throw new Error(`The picture process could not run: ${ended.errors.slice(0, 500)}`);
    const said = JSON.parse(ended.output) as { picture?: { widthPx: number; heightPx: number; tags: PictureTags }; fault?: string };
    if (!said.picture) return { ok: false, fault: /pixel limit/.test(said.fault ?? "") ? "too-many-pixels" : /memory/.test(said.fault ?? "") ? "too-costly" : "broken" };
    return { ok: true, ...said.picture, preview: await readFile(preview) };
  } finally {
    await rm(folder, { recursive: true, force: true });
  }
}

type Ended = { code: number | null; signal: NodeJS.Signals | null; output: string; errors: string };

/** The shell sets the limits and becomes the child; a system without one of them leaves it out. */
const LIMITED = 'ulimit -v "$1" 2>/dev/null; ulimit -t "$2" 2>/dev/null; ulimit -c 0 2>/dev/null; shift 2; exec "$@"';

function runChild(given: string[], { seconds, memoryMb }: Bounds): Promise<Ended> {
  const limits = [String((RUNTIME_MB + memoryMb) * 1024), String(seconds)];
  // No secret of this process goes along, and one decoding thread keeps the memory small.
  const env = { VIPS_CONCURRENCY: "1", NODE_ENV: "production" } as const;
  const child = spawn("/bin/sh", ["-c", LIMITED, "sh", ...limits, process.execPath, "--max-old-space-size=96", CHILD, ...given], { env, stdio: ["ignore", "pipe", "pipe"] });
  return new Promise((resolve, reject) => {
    let [output, errors] = ["", ""];
    const timer = setTimeout(() => child.kill("SIGKILL"), seconds * 1000);
    child.stdout.on("data", (part: Buffer) => (output = (output + part.toString("utf8")).slice(0, 64 * 1024)));
    child.stderr.on("data", (part: Buffer) => (errors = (errors + part.toString("utf8")).slice(0, 4096)));
    child.on("error", (error) => {
      clearTimeout(timer);
      reject(error);
    });
    child.on("close", (code, signal) => {
      clearTimeout(timer);
      resolve({ code, signal, output, errors });
    });
  });
}
