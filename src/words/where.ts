import type { View } from '#src/replica/view.ts';

/** A boat's name. */
export function boatWords(view: View, boatId: string): string {
  return view.find('boat', boatId)?.name ?? 'a boat not known here';
}

/** A stage's name; 'no stage' where there is none. */
export function stageWords(view: View, stageId: string | null | undefined): string {
  if (!stageId) return 'no stage';
  return view.find('stage', stageId)?.name ?? 'a stage not known here';
}

/** 'Juniper Tide · Varnish'. */
export function whereWords(view: View, boatId: string, stageId: string | null | undefined): string {
  return `${boatWords(view, boatId)} · ${stageWords(view, stageId)}`;
}
