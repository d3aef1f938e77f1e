interface BadgeProps {
  /** Nothing is shown for 0. */
  count: number;
  /** What is counted, for a screen reader, for example 'loose ends'. */
  what?: string;
}

/** A count that grows in place; nothing pops up beside it. */
export function Badge({ count, what }: BadgeProps) {
  if (count === 0) return null;
  return (
    <span className="inline-flex min-w-7 items-center justify-center rounded-key border-2 border-on-seam bg-seam px-[6px] text-[16px] leading-6 font-bold text-on-seam">
      {count}
      {what !== undefined && <span className="sr-only"> {what}</span>}
    </span>
  );
}
