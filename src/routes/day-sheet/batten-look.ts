/** The classes of what holds marks on the ribband line, 44 px left of its words. */
export const BATTEN_LOOK =
  'relative isolate before:absolute before:top-0 before:bottom-0 before:left-[12.5px] before:z-10 before:w-[3px] before:bg-bilge empty:hidden';

/** Lets the line run on into the blocks above and below, over their padding and the seam between them. */
export const RUNS_ON = 'lg:before:-top-3 lg:before:-bottom-[11px]';
