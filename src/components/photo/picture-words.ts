import type { SeenPicture } from '#src/replica/hooks.tsx';

/** How a picture stands, in a word or two; null where there is nothing to say. `device` is 'phone' and the like. */
export function pictureWords({ state, held }: SeenPicture, device: string): string | null {
  if (held?.state === 'refused') return 'Not taken';
  if (held) return `On this ${device}`;
  if (state === 'coming') return 'On its way';
  if (state === 'away') return 'Not here yet';
  return null;
}
