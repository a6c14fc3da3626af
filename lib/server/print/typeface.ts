/** The fonts of the paper, and putting text in them. Only static TTF cuts: pdfkit cannot read the screen's variable woff2. */
import "server-only";
import { readFileSync } from "node:fs";
import path from "node:path";

/** Every measure is set in `measure` or `title`: Sofia Sans Condensed draws fractions, Atkinson Hyperlegible does not. */
const files = {
  words: "atkinson-hyperlegible-next-400.ttf",
  strong: "atkinson-hyperlegible-next-700.ttf",
  measure: "sofia-sans-condensed-600.ttf",
  title: "sofia-sans-condensed-700.ttf",
} as const;

export type Typeface = keyof typeof files;

export interface TextStyle {
  readonly face: Typeface;
  readonly size: number;
  readonly color?: string;
}

export interface TextBox {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly align?: "left" | "center" | "right";
  /** One line, with an ellipsis where it is too long. */
  readonly oneLine?: boolean;
  /** Of the first line, where something else stands before it. */
  readonly indent?: number;
}

export const black = "#000000";
/** Secondary text: dark enough for any printer. */
export const grey = "#4a4f52";
export const hairline = "#9aa0a2";

let loaded: ReadonlyMap<Typeface, Buffer> | undefined;

/** Read once a process: some 300 kB. */
export function registerTypefaces(doc: PDFKit.PDFDocument): void {
  const folder = path.join(process.cwd(), "public", "fonts", "print");
  loaded ??= new Map(typefaces.map((name) => [name, readFileSync(path.join(folder, files[name]))]));
  for (const [name, bytes] of loaded) doc.registerFont(name, bytes);
}

const typefaces: readonly Typeface[] = ["words", "strong", "measure", "title"];

/** Draws the text, wrapped to the box, and answers its height. */
export function putText(doc: PDFKit.PDFDocument, text: string, style: TextStyle, box: TextBox): number {
  const height = heightOfText(doc, text, style, box);
  doc.fillColor(style.color ?? black).text(text, box.x, box.y, optionsOf(doc, style, box));
  return height;
}

/** Also for text that is not drawn yet. */
export function heightOfText(
  doc: PDFKit.PDFDocument,
  text: string,
  style: TextStyle,
  box: Pick<TextBox, "width" | "oneLine" | "indent">,
): number {
  doc.font(style.face).fontSize(style.size);
  return box.oneLine ? doc.currentLineHeight(true) : doc.heightOfString(text, optionsOf(doc, style, box));
}

export function widthOfText(doc: PDFKit.PDFDocument, text: string, style: TextStyle): number {
  return doc.font(style.face).fontSize(style.size).widthOfString(text, featuresOf(style));
}

function optionsOf(doc: PDFKit.PDFDocument, style: TextStyle, box: Pick<TextBox, "width" | "align" | "oneLine" | "indent">) {
  return {
    width: box.width,
    align: box.align ?? ("left" as const),
    ...featuresOf(style),
    ...(box.indent !== undefined && { indent: box.indent }),
    ...(box.oneLine && { height: doc.currentLineHeight(true), ellipsis: true }),
  };
}

/** Figures of one width where columns of them are read. Nothing elsewhere: pdfkit remembers words only when no feature is asked for. */
const featuresOf = ({ face }: TextStyle): { features?: PDFKit.Mixins.OpenTypeFeatures[] } =>
  face === "measure" ? { features: ["tnum"] } : {};
