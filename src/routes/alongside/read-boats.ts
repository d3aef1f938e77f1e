import type { BoatRow } from '#shared/boat/boat.ts';
import type { StageRow } from '#shared/stage/stage.ts';
import type { View } from '#src/replica/view.ts';

/** Where somebody works; null for the stage where the boat has none, or the work belongs to none. */
export interface Where {
  boatId: string;
  stageId: string | null;
}

export interface BoatToChoose {
  id: string;
  name: string;
  note: string;
  stages: { id: string; name: string; isDone: boolean }[];
}

/** The boats in the shop with their stages, by name. */
export function readBoats(view: View): BoatToChoose[] {
  return view
    .all('boat')
    .filter((boat) => !boat.struck)
    .sort((a, b) => a.name.localeCompare(b.name))
    .map((boat) => ({
      id: boat.id,
      name: boat.name,
      note: particulars(boat),
      stages: stagesOf(view, boat.id).map(({ id, name, done }) => ({ id, name, isDone: done })),
    }));
}

/** A boat's stages in their order. */
export function stagesOf(view: View, boatId: string): StageRow[] {
  return view
    .all('stage')
    .filter((stage) => stage.boatId === boatId && !stage.struck)
    .sort((a, b) => a.order - b.order || a.name.localeCompare(b.name));
}

/** What was remembered if it is still there, else where this person logged last, else the first boat; null without a boat. */
export function readWhere(view: View, remembered: Partial<Where>): Where | null {
  const boats = readBoats(view);
  const boat = boats.find(({ id }) => id === remembered.boatId);
  if (boat) return { boatId: boat.id, stageId: stageIn(boat, remembered.stageId) };
  const last = lastLogged(view);
  const lastBoat = boats.find(({ id }) => id === last?.boatId) ?? boats[0];
  return lastBoat ? { boatId: lastBoat.id, stageId: stageIn(lastBoat, last?.stageId) } : null;
}

function stageIn(boat: BoatToChoose, stageId: string | null | undefined): string | null {
  if (boat.stages.some(({ id }) => id === stageId)) return stageId!;
  return boat.stages.find(({ isDone }) => !isDone)?.id ?? null;
}

function lastLogged(view: View): Where | undefined {
  return view
    .all('entry')
    .filter((entry) => entry.authorId === view.me.personId && !entry.struck)
    .reduce<(Where & { writtenAt: string }) | undefined>(
      (last, entry) => (last && last.writtenAt >= entry.writtenAt ? last : entry),
      undefined,
    );
}

function particulars(boat: BoatRow): string {
  return [boat.type, boat.hullNumber && `hull ${boat.hullNumber}`].filter(Boolean).join(' · ');
}
