// Runs as a process of its own, since decoding a stranger's picture is the most dangerous thing that this program does.
// Arguments: path of the original, path for the preview, largest number of pixels, longest side of the preview.
// Prints one JSON object: { picture } or { fault }.
import exifr from "exifr";
import sharp from "sharp";

const [, , original = "", preview = "", maxPixels = "0", maxSide = "0"] = process.argv;

sharp.cache(false);
sharp.concurrency(1);
sharp.block({ operation: ["VipsForeignLoad"] });
sharp.unblock({ operation: ["VipsForeignLoadJpeg", "VipsForeignLoadPng", "VipsForeignLoadWebp"] });

const PREFIX = "Exif\0\0";
const TAGS = ["Make", "Model", "DateTimeOriginal", "OffsetTimeOriginal", "CreateDate", "OffsetTimeDigitized", "OffsetTime", "GPSDateStamp", "GPSTimeStamp", "GPSLatitude", "GPSLatitudeRef", "GPSLongitude", "GPSLongitudeRef"];

/** Tags as they stand; a picture with damaged EXIF is still a picture. */
async function readTags(exif) {
  if (!exif) return {};
  const tiff = exif.subarray(0, 6).toString("latin1") === PREFIX ? exif.subarray(6) : exif;
  return exifr.parse(tiff, { tiff: true, ifd0: {}, exif: true, gps: true, pick: TAGS, reviveValues: false, translateValues: false, sanitize: true }).then((tags) => tags ?? {}, () => ({}));
}

async function examine() {
  const options = { limitInputPixels: Number(maxPixels), failOn: "error", pages: 1 };
  const meta = await sharp(original, options).metadata();
  await sharp(original, options)
    .autoOrient()
    .resize({ width: Number(maxSide), height: Number(maxSide), fit: "inside", withoutEnlargement: true })
    .flatten({ background: "#ffffff" })
    .toColourspace("srgb")
    .jpeg({ quality: 82 })
    .toFile(preview);
  return { format: meta.format, widthPx: meta.autoOrient.width, heightPx: meta.autoOrient.height, tags: await readTags(meta.exif) };
}

const answer = await examine().then((picture) => ({ picture }), (error) => ({ fault: String(error?.message ?? error).slice(0, 500) }));
process.stdout.write(JSON.stringify(answer));
