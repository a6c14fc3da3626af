/** Why a revision of a cut order no longer holds: the same on screen, at the bench and in refusals. */
export const supersededWhy = "the layout, or what is marked on its boards, was changed after it was issued";
