/** Where the browser remembers which rig was in hand last: a hint for what to show first, never part of the Book. */
export const RIG_IN_HAND_KEY = 'holdoff.rig-in-hand';
