import type { BoatRow } from '../boat/boat.ts';
import type { EntryRow } from '../entry/entry.ts';
import type { FindingRow } from '../finding/finding.ts';
import type { DeviceRow } from '../identity/device.ts';
import type { PersonRow } from '../identity/person.ts';
import type { ShopRow } from '../identity/shop.ts';
import type { PhotoRow } from '../photo/photo.ts';
import type { SetAsideRow } from '../set-aside/set-aside.ts';
import type { SoundRow } from '../sound/sound.ts';
import type { StageRow } from '../stage/stage.ts';
import type { TaskRow } from '../task/task.ts';
import type { LooseEnd } from './loose-ends.ts';

/** The shape of a row by its entity. */
export interface RowOf {
  shop: ShopRow;
  person: PersonRow;
  device: DeviceRow;
  boat: BoatRow;
  stage: StageRow;
  task: TaskRow;
  entry: EntryRow;
  finding: FindingRow;
  sound: SoundRow;
  photo: PhotoRow;
  setAside: SetAsideRow;
  looseEnd: LooseEnd;
}
