/** Reads PDFs back with poppler, which shares no code with the library that wrote them. */
import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import path from "node:path";

export interface PdfWord {
  readonly text: string;
  /** Points from the upper left corner of the page. */
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

export interface PdfPage {
  readonly width: number;
  readonly height: number;
  readonly words: readonly PdfWord[];
}

/** Every page with the place of every word on it. */
export function pdfPages(pdf: Uint8Array): readonly PdfPage[] {
  const xml = withFile(pdf, (file) => run("pdftotext", ["-bbox", file, "-"]));
  return xml
    .split("<page ")
    .slice(1)
    .map((page) => {
      const [, width, height] = /^width="([\d.]+)" height="([\d.]+)"/.exec(page) ?? [];
      const words = [
        ...page.matchAll(/<word xMin="([-\d.]+)" yMin="([-\d.]+)" xMax="([-\d.]+)" yMax="([-\d.]+)">(.*?)<\/word>/g),
      ];
      return {
        width: Number(width),
        height: Number(height),
        words: words.map(([, left, top, right, bottom, text]) => ({
          text: text ?? "",
          left: Number(left),
          top: Number(top),
          right: Number(right),
          bottom: Number(bottom),
        })),
      };
    });
}

/** The text of each page, in the order of the file. */
export function pdfText(pdf: Uint8Array): readonly string[] {
  return withFile(pdf, (file) => run("pdftotext", ["-layout", file, "-"]))
    .split("\f")
    .slice(0, -1);
}

/** Name and whether it is embedded, of every font. */
export function pdfFonts(pdf: Uint8Array): readonly { readonly name: string; readonly embedded: boolean }[] {
  const lines = withFile(pdf, (file) => run("pdffonts", [file]))
    .trim()
    .split("\n")
    .slice(2);
  // Name, type (two words), encoding, then yes or no for embedded, subset and Unicode.
  return lines.map((line) => ({
    name: line.split(/\s+/)[0] ?? "",
    embedded: /\s(yes)\s+(yes|no)\s+(yes|no)\s+\d+\s+\d+$/.test(line),
  }));
}

/** Pictures in the file: kind of compression and size in pixels. */
export function pdfPictures(
  pdf: Uint8Array,
): readonly { readonly encoding: string; readonly widthPx: number; readonly heightPx: number }[] {
  const lines = withFile(pdf, (file) => run("pdfimages", ["-list", file]))
    .trim()
    .split("\n")
    .slice(2);
  return lines.map((line) => {
    const fields = line.trim().split(/\s+/);
    return { widthPx: Number(fields[3]), heightPx: Number(fields[4]), encoding: fields[8] ?? "" };
  });
}

function withFile<T>(pdf: Uint8Array, read: (file: string) => T): T {
  const folder = mkdtempSync(path.join(tmpdir(), "read-pdf-"));
  try {
    const file = path.join(folder, "a.pdf");
    writeFileSync(file, pdf);
    return read(file);
  } finally {
    rmSync(folder, { recursive: true });
  }
}

const run = (program: string, args: readonly string[]): string =>
  execFileSync(program, args, { encoding: "utf8", maxBuffer: 64 * 1024 * 1024 });
