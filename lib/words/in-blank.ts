/** That a board is spoken for by a blank, and the way out, in plain words. */

export function inBlankSentence(tag: string, blankTag: string): string {
  return `${tag} is in blank ${blankTag}. Take that blank apart first, or use another board.`;
}
