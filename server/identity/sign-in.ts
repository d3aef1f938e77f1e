import type { SessionAnswer, SessionRequest, ShopChoice } from '#shared/identity/session.ts';
import type { Role } from '#shared/identity/role.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import { query } from '#server/models/query.ts';
import type { Parts } from '#server/parts.ts';
import { ACCESS_TOKEN_SECONDS, writeAccessToken, type Bearer } from './access-token.ts';
import { enrol } from './enrol.ts';
import { openFamily } from './families.ts';
import { installationSecret } from './installation.ts';
import { whoseIsThis } from './passwords.ts';
import { writeRefreshToken, type RefreshToken } from './refresh-token.ts';

interface Candidate {
  shopId: string;
  id: string;
  name: string;
  roles: Role[];
  passwordHash: string;
}

export interface SignedIn {
  answer: SessionAnswer;
  refreshToken: string;
}

/** An e-mail may be in two shops; an unknown one must take as long as that. */
const COMPARISONS_MIN = 2;

/** Signs a person in on a device. Throws a 401 that never tells why, or a 409 with the shops to choose from. */
export async function signIn(parts: Parts, request: SessionRequest): Promise<SignedIn> {
  const { database, now, onChanged } = parts;
  const candidates = await findCandidates(database, request);
  const comparisonsMin = request.shopId ? 1 : COMPARISONS_MIN;
  const [person, ...others] = await whoseIsThis(request.password, candidates, comparisonsMin);
  if (!person) throw new Problem(401, 'The e-mail or the password is not right.');
  if (others.length > 0) throw await whichShop(database, [person, ...others]);

  const bearer = { personId: person.id, shopId: person.shopId, deviceId: request.device.id };
  const [seq, token] = await database.inShop(
    person.shopId,
    async (transaction) =>
      [
        await enrol(database, transaction, bearer, request.device),
        await openFamily(database, transaction, bearer, now()),
      ] as const,
  );
  if (seq !== null) onChanged(person.shopId, seq);
  return signedIn(parts, bearer, person, token);
}

/** What a person who is signed in is given. */
export async function signedIn(
  { database, now }: Parts,
  bearer: Bearer,
  person: { name: string; roles: Role[] },
  token: RefreshToken,
): Promise<SignedIn> {
  const secret = await installationSecret(database);
  const { personId, shopId, deviceId } = bearer;
  return {
    answer: {
      accessToken: writeAccessToken(secret, bearer, now()),
      expiresInSeconds: ACCESS_TOKEN_SECONDS,
      person: { id: personId, name: person.name, roles: person.roles, shopId },
      device: { id: deviceId },
    },
    refreshToken: writeRefreshToken(secret, token),
  };
}

// in no shop's transaction: row security then shows nothing but the people of this e-mail
async function findCandidates(
  { sequelize }: Database,
  { email, shopId }: SessionRequest,
): Promise<Candidate[]> {
  const found = await sequelize.transaction(async (transaction) => {
    await query(transaction, `SELECT set_config('ribband.sign_in_email', $1, true)`, [email]);
    return query<Candidate>(
      transaction,
      `SELECT shop_id AS "shopId", id, name, roles, password_hash AS "passwordHash"
       FROM people WHERE email = $1 AND left_at IS NULL ORDER BY shop_id`,
      [email],
    );
  });
  return shopId ? found.filter((candidate) => candidate.shopId === shopId) : found;
}

async function whichShop(database: Database, people: Candidate[]): Promise<Problem> {
  const shops: ShopChoice = [];
  for (const { shopId } of people) {
    const shop = await database.inShop(shopId, (transaction) =>
      database.models.Shop.findOne({ where: { shopId }, transaction, rejectOnEmpty: true }),
    );
    shops.push({ id: shopId, name: shop.name });
  }
  return new Problem(409, 'This e-mail is in more than one shop. Say which.', {
    title: 'Which shop?',
    more: { shops },
  });
}
