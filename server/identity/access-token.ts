import { createSecretKey } from 'node:crypto';
import jwt from 'jsonwebtoken';
import { z } from 'zod';
import { idSchema } from '#shared/sync/ids.ts';

export const ACCESS_TOKEN_SECONDS = 15 * 60;

const claimsSchema = z.object({ sub: idSchema, shop: idSchema, device: idSchema, exp: z.int() });

/** Who asks, for which shop and from which device. */
export interface Bearer {
  personId: string;
  shopId: string;
  deviceId: string;
}

/** A JWT (RFC 7519, HS256) that holds for 15 minutes from `nowMs`. */
export function writeAccessToken(secret: string, bearer: Bearer, nowMs: number): string {
  const iat = Math.floor(nowMs / 1000);
  const claims = {
    sub: bearer.personId,
    shop: bearer.shopId,
    device: bearer.deviceId,
    iat,
    exp: iat + ACCESS_TOKEN_SECONDS,
  };
  return jwt.sign(claims, secret, { algorithm: 'HS256' });
}

/** Whose token it is and when it ends, or null where it is not one of ours or has ended. */
export function readAccessToken(
  secret: string,
  token: string,
  nowMs: number,
): (Bearer & { endsAtMs: number }) | null {
  const claims = claimsSchema.safeParse(verified(secret, token, nowMs));
  if (!claims.success) return null;
  const { sub, shop, device, exp } = claims.data;
  return { personId: sub, shopId: shop, deviceId: device, endsAtMs: exp * 1000 };
}

function verified(secret: string, token: string, nowMs: number): unknown {
  try {
    // a secret given as text is first tried as a public key, which takes longer than all the rest
    return jwt.verify(token, createSecretKey(secret, 'utf8'), { algorithms: ['HS256'], clockTimestamp: Math.floor(nowMs / 1000) });
  } catch (error) {
    if (error instanceof jwt.JsonWebTokenError) return null;
    throw error;
  }
}
