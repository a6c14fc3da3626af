/** The table of patterns: the only place in the core that tells them apart. */
import { cutOutRules } from "./cut-out/cut-out-rules";
import type { Face, Pattern } from "./face";
import { gridRules } from "./grid/grid-rules";
import type { PatternRules } from "./pattern-rules";
import { resawnRules } from "./resawn/resawn-rules";
import { wrapRules } from "./wrap/wrap-rules";

type FaceOf<P extends Pattern> = Extract<Face, { readonly pattern: P }>;

const rules: { readonly [P in Pattern]: PatternRules<FaceOf<P>> } = {
  grid: gridRules,
  cutOut: cutOutRules,
  wrap: wrapRules,
  resawn: resawnRules,
};

/** The rules of a face's own pattern. */
export function rulesOf<F extends Face>(face: F): PatternRules<F> {
  // The tag of the face is the key of its rules, which the checker cannot follow through an index.
  return rules[face.pattern] as unknown as PatternRules<F>;
}
