import type { Units } from '#shared/measure/length.ts';
import type { View } from '#src/replica/view.ts';

/** The units that the shop measures in. */
export function unitsOf(view: View): Units {
  return view.all('shop')[0]?.units ?? 'imperial';
}
