import jwt from 'jsonwebtoken';
import { expect, test } from 'vitest';
import { readAccessToken, writeAccessToken } from '#server/identity/access-token.ts';

// RFC 7515, appendix A.1 (the JWT of RFC 7519, section 3.1)
const HEADER = 'eyJ0eXAiOiJKV1QiLA0KICJhbGciOiJIUzI1NiJ9';
const PAYLOAD =
  'eyJpc3MiOiJqb2UiLA0KICJleHAiOjEzMDA4MTkzODAsDQogImh0dHA6Ly9leGFtcGxlLmNvbS9pc19yb290Ijp0cnVlfQ';
const SIGNATURE = 'dBjftJeZ4CVP-mB92K27uhbUJU1p1r_wW1gFWFOEjXk';
const KEY = Buffer.from(
  'AyM1SysPpbyDfgZld3umj1qzKObwVMkoqQ-EstJQLr_T-1qS0gZH75aKtMN3Yj0iPS4hcgUuTwjAzZr1Z9CAow',
  'base64url',
);
const EXP_SECONDS = 1300819380;

function verify(signature: string, clockTimestamp: number): unknown {
  return jwt.verify(`${HEADER}.${PAYLOAD}.${signature}`, KEY, { algorithms: ['HS256'], clockTimestamp });
}

test('the token of RFC 7515 A.1 is read before its end', () => {
  expect(verify(SIGNATURE, EXP_SECONDS - 1)).toEqual({
    iss: 'joe',
    exp: EXP_SECONDS,
    'http://example.com/is_root': true,
  });
});

test('the token of RFC 7515 A.1 is refused from its end on', () => {
  expect(() => verify(SIGNATURE, EXP_SECONDS)).toThrow('jwt expired');
});

test('a signature with one letter changed is refused', () => {
  expect(() => verify(SIGNATURE.replace('d', 'e'), EXP_SECONDS - 1)).toThrow('invalid signature');
});

const bearer = {
  personId: '017f22e2-79b0-7cc3-98c4-dc0c0c07398f',
  shopId: '017f22e2-79b0-7cc3-98c4-dc0c0c073990',
  deviceId: '017f22e2-79b0-7cc3-98c4-dc0c0c073991',
};
const NOW_MS = Date.parse('2026-06-01T09:00:00Z');

test('an access token says who asks for a quarter of an hour', () => {
  const token = writeAccessToken('secret', bearer, NOW_MS);
  const endsAtMs = NOW_MS + 900_000;
  expect(readAccessToken('secret', token, endsAtMs - 1000)).toEqual({ ...bearer, endsAtMs });
  expect(readAccessToken('secret', token, endsAtMs)).toBeNull();
});

test('an access token under another secret, or without a signature, says nothing', () => {
  expect(readAccessToken('other', writeAccessToken('secret', bearer, NOW_MS), NOW_MS)).toBeNull();
  const claims = {
    sub: bearer.personId,
    shop: bearer.shopId,
    device: bearer.deviceId,
    exp: NOW_MS / 1000 + 900,
  };
  expect(readAccessToken('secret', jwt.sign(claims, null, { algorithm: 'none' }), NOW_MS)).toBeNull();
});
