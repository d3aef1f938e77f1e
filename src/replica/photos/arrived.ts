import type { Arrived } from '#shared/photo/photo.ts';
import type { View } from '../view.ts';
import type { PictureSize } from './picture.ts';

const seen = new WeakMap<View, Map<string, Arrived>>();

/** How much of a picture the server has, as last heard; undefined where no row that is here names it. */
export function arrivedOf(view: View, sha256: string): Arrived | undefined {
  const known = seen.get(view) ?? arrivals(view);
  seen.set(view, known);
  return known.get(sha256);
}

/** Whether the server has a picture in a size. Where no row tells, it may. */
export function canCome(arrived: Arrived | undefined, size: PictureSize): boolean {
  return arrived === undefined || arrived === 'full' || (arrived === 'thumb' && size === 'thumb');
}

// one picture may be several photos, one of them held and so without news of its bytes
function arrivals(view: View): Map<string, Arrived> {
  const arrivals = new Map<string, Arrived>();
  for (const { sha256, arrived } of view.all('photo')) {
    const known = arrivals.get(sha256) ?? null;
    arrivals.set(sha256, known === 'full' || arrived === 'full' ? 'full' : (known ?? arrived));
  }
  return arrivals;
}
