import { makeClock } from './clock.ts';
import { MemoryServer } from './memory-server.ts';
import { Phone, type Tab } from './phone.ts';

const SHOP_ID = '019e8000-0000-7000-8000-00000000000a';

/** Maud is foreman, Ned and Orla are crew. */
export const PEOPLE = {
  Maud: '019e8000-0000-7000-8000-0000000000b0',
  Ned: '019e8000-0000-7000-8000-0000000000b1',
  Orla: '019e8000-0000-7000-8000-0000000000b2',
};
export const START = '2026-06-01T08:00:00.000Z';

/** A shop in memory with a boat, a stage and a task, and phones to be opened on it. */
export async function openShop() {
  const clock = makeClock(Date.parse(START));
  const server = new MemoryServer(SHOP_ID, clock.now);
  server.addPerson(PEOPLE.Maud, 'Maud', ['foreman']);
  server.addPerson(PEOPLE.Ned, 'Ned', ['crew']);
  server.addPerson(PEOPLE.Orla, 'Orla', ['crew']);
  let seed = 0;
  const newPhone = () => new Phone(`phone ${(seed += 1)}`, server, clock.now, seed);
  const desk = newPhone();
  const { replica } = await openTab(desk, 'Maud');
  const [boatId, stageId, taskId] = [replica.newId(), replica.newId(), replica.newId()];
  await replica.hold('boat.add', { boatId, name: 'Petrel' });
  await replica.hold('stage.add', { stageId, boatId, name: 'Strip', order: 1, after: [] });
  await replica.hold('task.add', { taskId, boatId, stageId, title: 'Number the ribs' });
  await replica.syncNow();
  return { clock, server, newPhone, desk, replica, boatId, stageId, taskId };
}

/** Opens a tab on a phone, and where a name is given signs them in there and syncs. */
export async function openTab(phone: Phone, name?: keyof typeof PEOPLE): Promise<Tab> {
  const tab = (await phone.openTab())!;
  if (!name) return tab;
  await signIn(tab, name);
  await tab.replica.syncNow();
  return tab;
}

export async function signIn({ replica }: Tab, name: keyof typeof PEOPLE): Promise<void> {
  const result = await replica.session.signIn({
    email: `${name}@ribband.test`,
    password: 'tallow',
    label: 'a phone',
  });
  if (!('ok' in result)) throw new Error(`${name} is not signed in: ${JSON.stringify(result)}`);
}

interface Where {
  boatId: string;
  stageId: string;
}

/** The data of an entry. */
export function entryData(entryId: string, { boatId, stageId }: Where, text = 'Scarfed the stem') {
  return { entryId, boatId, stageId, workDate: '2026-06-01', text, spoken: false, hours: [] };
}
