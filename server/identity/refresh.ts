import type { Transaction } from 'sequelize';
import { Problem } from '#server/middleware/problem.ts';
import type { PersonColumns } from '#server/models/person.ts';
import type { Parts } from '#server/parts.ts';
import type { Bearer } from './access-token.ts';
import { endFamilies, handOver, presentToken } from './families.ts';
import { installationSecret } from './installation.ts';
import { readRefreshToken, type RefreshToken } from './refresh-token.ts';
import { signedIn, type SignedIn } from './sign-in.ts';

/** Goes on as the person who is signed in, or as another one enrolled on the same device. Throws a 401 or a 403. */
export async function refresh(parts: Parts, cookie: string | null, personId?: string): Promise<SignedIn> {
  const token = await readCookie(parts, cookie);
  if (!token) throw signInAgain();
  const found = await parts.database.inShop(token.shopId, (transaction) =>
    goOn(parts, transaction, token, personId),
  );
  // thrown out here, since within the transaction it would undo the end of the family
  if (found === null) throw signInAgain();
  if (found === 'not enrolled') throw new Problem(403, 'That person has not signed in on this device.');
  return signedIn(parts, found.bearer, found.person, { ...token, number: token.number + 1 });
}

/** Ends what the cookie stands for, if it stands for anything. */
export async function signOut(parts: Parts, cookie: string | null): Promise<void> {
  const token = await readCookie(parts, cookie);
  if (!token) return;
  const { shopId, familyId } = token;
  await parts.database.inShop(shopId, (transaction) =>
    endFamilies(parts.database, transaction, { shopId, id: familyId }, parts.now()),
  );
}

async function readCookie({ database }: Parts, cookie: string | null): Promise<RefreshToken | null> {
  return cookie === null ? null : readRefreshToken(await installationSecret(database), cookie);
}

function signInAgain(): Problem {
  return new Problem(401, 'Sign in again on this device.');
}

async function goOn(
  { database, now }: Parts,
  transaction: Transaction,
  token: RefreshToken,
  personId?: string,
): Promise<{ bearer: Bearer; person: PersonColumns } | 'not enrolled' | null> {
  const bearer = await presentToken(database, transaction, token, now());
  if (!bearer) return null;
  const { DevicePerson, Person } = database.models;
  const { shopId, deviceId } = bearer;
  const id = personId ?? bearer.personId;
  const enrolled = await DevicePerson.count({ where: { shopId, deviceId, personId: id }, transaction });
  if (enrolled === 0) return 'not enrolled';
  const person = await Person.findOne({ where: { shopId, id }, transaction, rejectOnEmpty: true });
  if (person.leftAt) return null;
  if (id !== bearer.personId) await handOver(database, transaction, token, id);
  return { bearer: { ...bearer, personId: id }, person };
}
