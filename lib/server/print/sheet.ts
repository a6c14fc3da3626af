/** A document that fills from the top: where the next thing goes, and when a new page begins. Knows nothing of what is printed. */
import "server-only";
import PDFDocument from "pdfkit";
import { margins, type Paper, paperSizes } from "./paper";
import { registerTypefaces } from "./typeface";

export interface Sheet {
  readonly doc: PDFKit.PDFDocument;
  readonly left: number;
  readonly width: number;
  /** Content ends above this. */
  readonly bottom: number;
  /** Where the next thing goes. */
  y: number;
  /** Draws what stands at the head of every page but the first, and moves `y` below it. */
  headPage: () => void;
}

export interface SheetFacts {
  readonly title: string;
  readonly author: string;
  /** Stands in the file as its date, so that the same order always gives the same bytes. */
  readonly at: Date;
}

export function openSheet(paper: Paper, facts: SheetFacts): Sheet {
  const [paperWidth, paperHeight] = paperSizes[paper];
  const doc = openDocument([paperWidth, paperHeight], facts);
  return {
    doc,
    left: margins.side,
    width: paperWidth - 2 * margins.side,
    bottom: paperHeight - margins.bottom,
    y: margins.top,
    headPage: () => {},
  };
}

/** Pages are kept until the end, because each says how many there are. No margins: everything is placed by hand. */
export function openDocument(size: [number, number], facts: SheetFacts): PDFKit.PDFDocument {
  const doc = new PDFDocument({
    size,
    margin: 0,
    bufferPages: true,
    lang: "en",
    displayTitle: true,
    info: { Title: facts.title, Author: facts.author, Creator: "Grainwright", CreationDate: facts.at, ModDate: facts.at },
  });
  registerTypefaces(doc);
  return doc;
}

/** Begins a new page unless so much room is left on this one; answers whether it did. */
export function makeRoom(sheet: Sheet, height: number): boolean {
  if (sheet.y + height <= sheet.bottom) return false;
  sheet.doc.addPage();
  sheet.y = margins.top;
  sheet.headPage();
  return true;
}

/** Lets other requests in between: drawing is work for the one thread that answers them all. */
export function breathe(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}

/** The whole file. */
export async function closeDocument(doc: PDFKit.PDFDocument): Promise<Uint8Array> {
  const chunks: Buffer[] = [];
  const done = new Promise<void>((resolve, reject) => {
    doc.on("data", (chunk: Buffer) => chunks.push(chunk));
    doc.on("end", resolve);
    doc.on("error", reject);
  });
  doc.end();
  await done;
  return Buffer.concat(chunks);
}
