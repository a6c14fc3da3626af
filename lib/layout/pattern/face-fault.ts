/** What makes a face mean nothing, by pattern: mistakes of a program, not of a maker. */

export type FaceFault =
  | { readonly fault: "empty-face" }
  | { readonly fault: "gap-count"; readonly axis: "columns" | "rows" }
  | { readonly fault: "size-not-positive"; readonly axis: "columns" | "rows"; readonly index: number }
  | { readonly fault: "negative-length"; readonly where: "columnGaps" | "rowGaps" };
