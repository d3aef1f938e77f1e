/** The classes of a list whose marks hang on the ribband line, 44 px left of its words; on a desk the line runs on from block to block. */
export const BATTEN_LOOK =
  'relative isolate before:absolute before:top-0 before:bottom-0 before:left-[12.5px] before:z-10 before:w-[3px] before:bg-bilge empty:hidden lg:before:-top-3 lg:before:-bottom-[11px]';
