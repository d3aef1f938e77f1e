/** A link in a plank that the whole plank answers for. */
export const PLANK_LINK =
  'after:absolute after:inset-0 focus-visible:outline-none focus-visible:after:outline-3 focus-visible:after:outline-offset-[-5px] focus-visible:after:outline-bilge';
