import { z } from 'zod';
import { certaintySchema, extentSchema, knownSchema, type FindingRow } from '#shared/finding/finding.ts';
import { photoSetSchema, type PhotoRow } from '#shared/photo/photo.ts';
import { placeSchema } from '#shared/place/place.ts';
import type { SoundRow } from '#shared/sound/sound.ts';
import { isSameJson } from '#shared/sync/canonical.ts';
import { isSized } from '#src/routes/alongside/found/found-draft.ts';
import { plainPlace } from '#src/routes/alongside/place/carried.ts';

export type NoteEntity = 'finding' | 'sound' | 'photo';
export type NoteRow = FindingRow | SoundRow | PhotoRow;

/** What a form shows of a finding, of what was found sound, or of a photograph; each uses the fields that it has. */
export const noteValuesSchema = z.object({
  kind: z.string(),
  place: placeSchema,
  known: knownSchema,
  certainty: certaintySchema,
  seenExtent: extentSchema,
  fearedExtent: extentSchema,
  openToKnow: z.boolean(),
  text: z.string(),
  set: photoSetSchema.nullable(),
});
export type NoteValues = z.infer<typeof noteValuesSchema>;

/** A row's values as a form shows them: what nobody said is empty. */
export function valuesOf(entity: NoteEntity, row: NoteRow): NoteValues {
  const said = row as Partial<FindingRow & SoundRow & PhotoRow>;
  return {
    kind: (entity === 'sound' ? said.about : said.kind) ?? '',
    place: said.place ?? {},
    known: said.known ?? 'seen',
    certainty: said.certainty ?? 'suspected',
    seenExtent: said.seenExtent ?? {},
    fearedExtent: said.fearedExtent ?? {},
    openToKnow: said.openToKnow ?? false,
    text: (entity === 'photo' ? said.caption : said.text) ?? '',
    set: said.set ?? null,
  };
}

/** The fields of an amendment that has a row become what the form says: only those that differ. */
export function changedFields(entity: NoteEntity, row: NoteRow, values: NoteValues): Record<string, unknown> {
  const [before, after] = [fieldsOf(entity, valuesOf(entity, row)), fieldsOf(entity, values)];
  return Object.fromEntries(
    Object.entries(after).filter(([field, value]) => !isSameJson(value, before[field])),
  );
}

/** What the same fields say in the row now, for the way back. */
export function fieldsBefore(entity: NoteEntity, row: NoteRow, fields: string[]): Record<string, unknown> {
  const before = fieldsOf(entity, valuesOf(entity, row));
  return Object.fromEntries(fields.map((field) => [field, before[field]]));
}

function fieldsOf(entity: NoteEntity, values: NoteValues): Record<string, unknown> {
  const text = values.text.trim();
  const place = plainPlace(values.place);
  if (entity === 'photo') {
    return { place: Object.keys(place).length > 0 ? place : null, set: values.set, caption: text || null };
  }
  if (entity === 'sound') {
    return { place, known: values.known, about: values.kind.trim() || null, text: text || null };
  }
  const extent = (size: NoteValues['seenExtent']) => (isSized(size) ? size : null);
  return {
    place,
    known: values.known,
    text,
    kind: values.kind.trim(),
    certainty: values.certainty,
    seenExtent: extent(values.seenExtent),
    fearedExtent: extent(values.fearedExtent),
    openToKnow: values.openToKnow,
  };
}
