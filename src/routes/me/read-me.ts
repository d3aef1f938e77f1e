import type { Role } from '#shared/identity/role.ts';
import type { SyncState } from '#src/replica/sync-state.ts';
import type { View } from '#src/replica/view.ts';
import { listWords } from '#src/words/name-words.ts';

export interface MeLines {
  name: string;
  /** 'crew and owner' */
  roles: string;
  roleList: Role[];
  email: string | null;
  /** null until this device's row has come */
  deviceLabel: string | null;
}

/** Who is signed in, and on what. */
export function readMe(view: View): MeLines {
  const { me } = view;
  return {
    name: me.name,
    roles: listWords(me.roles),
    roleList: me.roles,
    email: view.find('person', me.personId)?.email ?? null,
    deviceLabel: view.find('device', me.deviceId)?.label ?? null,
  };
}

/** Whether the browser has promised to keep what is held, and what to do where it has not. */
export function storageWords(storage: SyncState['storage'], device: string): string {
  switch (storage) {
    case 'persistent':
      return 'Kept: the browser has promised not to clear it.';
    case 'best-effort':
      return `The browser may clear it when this ${device} runs out of room, or is not used for weeks. Put Ribband on the home screen to keep it.`;
    case 'unknown':
      return 'The browser does not say whether it keeps it.';
  }
}
