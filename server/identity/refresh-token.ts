import { createHmac, timingSafeEqual } from 'node:crypto';
import { isUuid } from '#shared/sync/ids.ts';

/** One token of a family; the next one's `number` is one higher. */
export interface RefreshToken {
  shopId: string;
  familyId: string;
  number: number;
}

/** As text; the same token always gives the same text, so that asking again gives the same successor. */
export function writeRefreshToken(secret: string, { shopId, familyId, number }: RefreshToken): string {
  const claim = `${shopId}.${familyId}.${number}`;
  return `${claim}.${sealOf(secret, claim)}`;
}

/** The token that the text says, or null where this installation did not write it. */
export function readRefreshToken(secret: string, text: string): RefreshToken | null {
  const [shopId, familyId, number, seal, ...rest] = text.split('.');
  if (!isUuid(shopId) || !isUuid(familyId) || !/^\d{1,9}$/.test(number ?? '') || !seal || rest.length > 0)
    return null;
  if (!isSame(seal, sealOf(secret, `${shopId}.${familyId}.${number}`))) return null;
  return { shopId, familyId, number: Number(number) };
}

// the prefix holds a colon, which the signed part of a JWT cannot: one kind of token is never the other
function sealOf(secret: string, claim: string): string {
  return createHmac('sha256', secret).update(`refresh:${claim}`).digest('base64url');
}

function isSame(left: string, right: string): boolean {
  const [a, b] = [Buffer.from(left), Buffer.from(right)];
  return a.length === b.length && timingSafeEqual(a, b);
}
