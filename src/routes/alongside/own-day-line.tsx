import { Hours } from '#src/components/hours.tsx';
import type { OwnDay } from '#src/routes/alongside/read-own-day.ts';
import { counted } from '#src/words/day-words.ts';

/** What oneself did on her today, in one line. */
export function OwnDayLine({ own }: { own: OwnDay }) {
  const counts = [
    own.entries > 0 && counted(own.entries, 'entry', 'entries'),
    own.photos > 0 && counted(own.photos, 'photo'),
    own.findings > 0 && `${own.findings} found`,
    own.sounds > 0 && `${own.sounds} sound`,
    own.ticks > 0 && `${own.ticks} ticked`,
  ].filter(Boolean);
  if (own.minutes === 0 && counts.length === 0) return null;
  return (
    <p className="pb-3 pl-[calc(var(--rib)+28px)] pr-4 md:pl-[calc(var(--rib)+36px)]">
      <span className="font-semibold">You: </span>
      {own.minutes > 0 ? <Hours minutes={own.minutes} /> : 'no hours yet'}
      {counts.length > 0 && `, ${counts.join(', ')}`}
    </p>
  );
}
