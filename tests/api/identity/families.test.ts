import { afterAll, beforeAll, expect, test, vi } from 'vitest';
import { presentToken } from '#server/identity/families.ts';
import { installationSecret } from '#server/identity/installation.ts';
import { readRefreshToken } from '#server/identity/refresh-token.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, signIn } from '#tests/worlds/shop.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.close());

async function waitersOnLocks(): Promise<number> {
  const [[found]] = (await server.database.sequelize.query(
    `SELECT count(*) FROM pg_locks JOIN pg_stat_activity USING (pid) WHERE NOT granted AND datname = current_database()`,
  )) as unknown as [[{ count: number }]];
  return found.count;
}

test('a token that comes while its successor is being taken is judged after it', async () => {
  const { people, shopId } = await makeShop(server.database);
  const { cookie } = await signIn(server, people.crew);
  const first = readRefreshToken(await installationSecret(server.database), cookie.split('=')[1]!)!;
  const present = (number: number, beforeCommit = () => Promise.resolve()) =>
    server.database.inShop(shopId, async (transaction) => {
      const bearer = await presentToken(
        server.database,
        transaction,
        { ...first, number },
        server.clock.now(),
      );
      await beforeCommit();
      return bearer;
    });
  await present(1);
  let late: Promise<unknown> | undefined;
  await present(2, async () => {
    late = present(1);
    await vi.waitFor(async () => expect(await waitersOnLocks()).toBe(1));
  });
  expect(await late).toBeNull();
  expect(await present(2)).toBeNull();
});
