import { expect, test, vi } from 'vitest';
import { openShop, openTab, signIn } from '#tests/worlds/signed-in-phone.ts';

test('a draft is there after the phone has died, as it was last written', async () => {
  const shop = await openShop();
  const phone = shop.newPhone();
  const { replica, power } = await openTab(phone, 'Ned');
  const writes = ['S', 'Sc', 'Sca'].map((text) => replica.draft.write('entry', { text }));
  expect(replica.draft.read('entry')).toEqual({ text: 'Sca' });
  await Promise.all(writes);
  power.cut();
  expect((await openTab(phone)).replica.draft.read('entry')).toEqual({ text: 'Sca' });
});

test('a draft that was cleared is gone', async () => {
  const shop = await openShop();
  const phone = shop.newPhone();
  const { replica, power } = await openTab(phone, 'Ned');
  await replica.draft.write('entry', 'words');
  await replica.draft.clear('entry');
  power.cut();
  expect((await openTab(phone)).replica.draft.read('entry')).toBeUndefined();
});

test('drafts, and where a person was last, are that person’s alone, and outlive signing out', async () => {
  const shop = await openShop();
  const tab = await openTab(shop.newPhone(), 'Ned');
  await tab.replica.draft.write('entry', 'Ned’s words');
  await tab.replica.remember.write({ boatId: shop.boatId });
  await tab.replica.session.signOut();
  await signIn(tab, 'Orla');
  expect(tab.replica.draft.read('entry')).toBeUndefined();
  expect(tab.replica.remember.read()).toEqual({ boatId: null, stageId: null });
  await signIn(tab, 'Ned');
  expect(tab.replica.draft.read('entry')).toBe('Ned’s words');
  expect(tab.replica.remember.read()).toEqual({ boatId: shop.boatId, stageId: null });
});

test('another tab has a draft as soon as it is kept', async () => {
  const shop = await openShop();
  const phone = shop.newPhone();
  const [one, other] = [await openTab(phone, 'Ned'), await openTab(phone)];
  await one.replica.draft.write('entry', 'words');
  await vi.waitFor(() => expect(other.replica.draft.read('entry')).toBe('words'));
});
