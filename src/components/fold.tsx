import type { ReactNode } from 'react';

interface FoldProps {
  title: ReactNode;
  isOpenAtFirst?: boolean;
  children: ReactNode;
}

/** Points at what is folded away, and down once it is open. */
export function FoldMark() {
  return (
    <svg
      className="shrink-0 group-open:rotate-90"
      width="20"
      height="20"
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth="2.6"
      aria-hidden="true"
    >
      <path d="M8 4l8 8-8 8" />
    </svg>
  );
}

/** Something that is there but folded away, opened by its title. */
export function Fold({ title, isOpenAtFirst = false, children }: FoldProps) {
  return (
    <details open={isOpenAtFirst} className="group">
      <summary className="flex min-h-key items-center gap-2 font-semibold text-verdigris underline decoration-2 underline-offset-4">
        <FoldMark />
        {title}
      </summary>
      <div className="pt-3">{children}</div>
    </details>
  );
}
