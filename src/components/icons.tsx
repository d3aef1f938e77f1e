import type { ReactNode } from 'react';

export type IconName = keyof typeof STROKES;

const STROKES = {
  entry: <path d="M4 20l1-5L16 4l4 4L9 19zM13 7l4 4M14 20.500h7" />,
  tick: <path d="M3.500 13.500l5.500 5.500L20.500 5.500" />,
  hours: (
    <>
      <circle cx="12" cy="12" r="9" />
      <path d="M12 6.500V12l4 2.500" />
    </>
  ),
  boat: <path d="M2 13h20c-1 4-3 6.500-6 6.500H8C5 19.500 3 17 2 13zM11 13V3.500l7 6.500h-7" />,
  list: (
    <path d="M4 5v14M8.500 6.500H21M8.500 12H21M8.500 17.500H21M2.500 6.500h3M2.500 12h3M2.500 17.500h3" />
  ),
  phone: <path d="M7 2.500h10v19H7zM7 17.500h10M11 19.500h2" />,
  plus: <path d="M12 4v16M4 12h16" />,
  minus: <path d="M4 12h16" />,
  back: <path d="M10.500 4.500L3 12l7.500 7.500M3.500 12H21" />,
  forward: <path d="M13.500 4.500L21 12l-7.500 7.500M20.500 12H3" />,
  undo: <path d="M8 4L3.500 8.500 8 13M4 8.500h10a5.750 5.750 0 010 11.500H8" />,
  people: (
    <>
      <circle cx="8.500" cy="8" r="3.500" />
      <path d="M2 20c0-4.500 2.500-6.500 6.500-6.500S15 15.500 15 20zM15.500 4.800a3.500 3.500 0 010 6.400M18 14.500c2.500.8 4 2.500 4 5.500h-3" />
    </>
  ),
  warning: <path d="M12 3L2 20.500h20zM12 9.500v5M12 16.500v2" />,
  photo: (
    <>
      <path d="M2.500 6.500h19v13.500h-19zM8 6.500L9.500 3.500h5L16 6.500" />
      <circle cx="12" cy="13" r="3.750" />
    </>
  ),
  found: <path d="M15 2.500l6.500 6.500-9 4-6.500 1.500L7.500 8zM9.500 14.500L3 21M6 21.500h12" />,
  search: (
    <>
      <circle cx="10.500" cy="10.500" r="7" />
      <path d="M15.500 15.500L21.500 21.500" />
    </>
  ),
  days: <path d="M3.500 5h17v15.500h-17zM3.500 10h17M8 2.500v5M16 2.500v5" />,
  pictures: <path d="M6.500 6.500h15v14h-15zM3 17V3h15M6.500 17l4.500-5 4 4.500 2.500-2.500 4 4" />,
  close: <path d="M5 5l14 14M19 5L5 19" />,
} satisfies Record<string, ReactNode>;

interface IconProps {
  name: IconName;
  /** Edge in px; 24 unless told. */
  size?: number;
  className?: string;
}

/** A drawn sign, always beside a word: it has no name of its own for a screen reader. */
export function Icon({ name, size = 24, className = '' }: IconProps) {
  return (
    <svg
      className={`shrink-0 ${className}`}
      width={size}
      height={size}
      viewBox="0 0 24 24"
      fill="none"
      stroke="currentColor"
      strokeWidth="2.2"
      aria-hidden="true"
    >
      {STROKES[name]}
    </svg>
  );
}
