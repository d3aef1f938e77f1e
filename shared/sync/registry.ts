import { boatKinds } from '../boat/kinds.ts';
import { entryKinds } from '../entry/kinds.ts';
import { findingKinds } from '../finding/kinds.ts';
import { photoKinds } from '../photo/kinds.ts';
import { setAsideKinds } from '../set-aside/kinds.ts';
import { soundKinds } from '../sound/kinds.ts';
import { stageKinds } from '../stage/kinds.ts';
import { taskKinds } from '../task/kinds.ts';
import type { AnyOpKind } from './op-kind.ts';

/** Every kind of op that this version understands, by name. */
export const opKinds: ReadonlyMap<string, AnyOpKind> = new Map(
  [boatKinds, stageKinds, taskKinds, entryKinds, findingKinds, soundKinds, photoKinds, setAsideKinds].flat().map((kind) => [kind.kind, kind]),
);
