/** That a board is spoken for by a blank, or was one, and the way out, in plain words. */

export function inBlankSentence(tag: string, blankTag: string): string {
  return `${tag} is in blank ${blankTag}. Take that blank apart first, or use another board.`;
}

export const takenApartSentence = (tag: string): string =>
  `Blank ${tag} was taken apart: there is no such board. Use another one.`;
