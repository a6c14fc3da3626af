/** The few facts of a photograph that are kept: when, with what camera, at what focal length. Everything else, places above all, is left behind. */
import "server-only";
import exifr from "exifr";

export interface ExifFacts {
  /** ISO 8601 in UTC. A camera that does not tell its zone is read as if its clock showed UTC. */
  readonly takenAt: string | null;
  readonly camera: string | null;
  readonly focalLengthMm: number | null;
}

const nothing: ExifFacts = { takenAt: null, camera: null, focalLengthMm: null };
const longestCamera = 80;

/** Facts from an EXIF block as it stands in the file. A block that cannot be read gives none: it is no fault of the picture. */
export async function readExifFacts(block: Uint8Array | undefined): Promise<ExifFacts> {
  if (block === undefined || block.length < 8) return nothing;
  const header = Buffer.from("Exif\0\0", "latin1");
  const tiff = Buffer.from(block.buffer, block.byteOffset, block.byteLength);
  const tags = await parseTags(tiff.subarray(0, 6).equals(header) ? tiff.subarray(6) : tiff);
  return {
    takenAt: takenAt(tags.DateTimeOriginal, tags.OffsetTimeOriginal),
    camera: camera(tags.Make, tags.Model),
    focalLengthMm: focalLength(tags.FocalLength),
  };
}

async function parseTags(tiff: Uint8Array): Promise<Record<string, unknown>> {
  try {
    const parsed: unknown = await exifr.parse(tiff, {
      pick: ["Make", "Model", "DateTimeOriginal", "OffsetTimeOriginal", "FocalLength"],
      reviveValues: false,
      translateValues: false,
    });
    return typeof parsed === "object" && parsed !== null ? { ...parsed } : {};
  } catch {
    // Broken EXIF is common in sound photographs, and nothing depends on it.
    return {};
  }
}

function takenAt(date: unknown, offset: unknown): string | null {
  const match = typeof date === "string" ? /^(\d{4}):(\d\d):(\d\d) (\d\d):(\d\d):(\d\d)/.exec(date) : null;
  if (match === null) return null;
  const zone = typeof offset === "string" && /^[+-]\d\d:\d\d$/.test(offset) ? offset : "Z";
  const [, year, month, day, hour, minute, second] = match;
  const time = new Date(`${year}-${month}-${day}T${hour}:${minute}:${second}${zone}`);
  return Number.isNaN(time.getTime()) || time.getUTCFullYear() < 1990 ? null : time.toISOString();
}

function camera(make: unknown, model: unknown): string | null {
  const maker = plain(make);
  const name = plain(model);
  // Many makers write their name into the model as well.
  const both = name.toLowerCase().startsWith(maker.toLowerCase()) ? name : `${maker} ${name}`;
  return both.trim().slice(0, longestCamera).trim() || null;
}

/** Letters, digits and plain punctuation only: it is shown on screens and comes from strangers. */
function plain(value: unknown): string {
  if (typeof value !== "string") return "";
  return value
    .normalize("NFC")
    .replace(/[^\p{L}\p{N} .,()/+\-_]/gu, " ")
    .replace(/\s+/g, " ")
    .trim();
}

function focalLength(value: unknown): number | null {
  return typeof value === "number" && Number.isFinite(value) && value > 0 && value < 5000 ? Math.round(value * 100) / 100 : null;
}
