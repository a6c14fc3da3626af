/** Why a revision of a cut order no longer holds: the same on screen, at the bench and in refusals. */
export const supersededWhy =
  "the layout, what is marked on its boards, or what was cut of them, has moved on since it was issued";
