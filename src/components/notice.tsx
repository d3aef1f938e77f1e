import type { ReactNode } from 'react';
import { Icon } from '#src/components/icons.tsx';

export type NoticeTone = 'info' | 'warn' | 'error';

interface NoticeProps {
  tone?: NoticeTone;
  /** What happened and what to do next, in one sentence. */
  children: ReactNode;
  /** A key that does it. */
  action?: ReactNode;
}

const TONES: Record<NoticeTone, string> = {
  info: 'border-bilge bg-plank text-bilge',
  warn: 'border-on-seam bg-seam text-on-seam',
  error: 'border-redlead bg-plank text-redlead',
};

/** A sentence that stands in the page, not over it. An error is read out at once, the rest when there is a pause. */
export function Notice({ tone = 'info', children, action }: NoticeProps) {
  return (
    <div
      role={tone === 'error' ? 'alert' : 'status'}
      className={`grid gap-3 border-l-[9px] border-y-2 border-r-2 px-4 py-3 ${TONES[tone]}`}
    >
      <div className="flex items-start gap-3">
        {tone !== 'info' && <Icon name="warning" className="mt-[1px]" />}
        <div className={tone === 'error' ? 'font-semibold' : ''}>{children}</div>
      </div>
      {action}
    </div>
  );
}
