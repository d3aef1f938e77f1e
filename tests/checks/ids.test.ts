import { parse, v7, validate, version } from 'uuid';
import { describe, expect, it } from 'vitest';
import { computedId, idFromSha256, isUuid, isUuidV7, newIdSchema, sha256Hex } from '#shared/sync/ids.ts';

// RFC 9562, appendix A.6; in lower case, as the record writes ids
const PUBLISHED_V7 = '017f22e2-79b0-7cc3-98c4-dc0c0c07398f';
const DNS_NAMESPACE = '6ba7b810-9dad-11d1-80b4-00c04fd430c8';

describe('UUIDv7', () => {
  it('reads the published one, as npm uuid does', () => {
    expect(isUuidV7(PUBLISHED_V7)).toBe(true);
    expect(validate(PUBLISHED_V7)).toBe(true);
    expect(version(PUBLISHED_V7)).toBe(7);
  });

  it('is made of the published time and lots by the generator that phones use', () => {
    const random = Uint8Array.from([0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0, 0]);
    const made = v7({ msecs: Date.parse('2022-02-22T19:22:22Z'), random, seq: 0 });
    expect(made.slice(0, 13)).toBe(PUBLISHED_V7.slice(0, 13));
    expect(isUuidV7(made)).toBe(true);
    expect(Number.parseInt(PUBLISHED_V7.replace('-', '').slice(0, 12), 16)).toBe(1645557742000);
  });

  it.each([
    // RFC 9562, appendices A.1 to A.5 and B.2: other versions are no ids of things people make
    ['version 1', 'c232ab00-9414-11ec-b3c8-9f6bdeced846'],
    ['version 3', '5df41881-3aed-3515-88a7-2f4a814cf09e'],
    ['version 4', '919108f7-52d1-4320-9bac-f847db4148a8'],
    ['version 5', '2ed6657d-e927-568b-95e1-2665a8aea6a2'],
    ['version 6', '1ec9414c-232a-6b00-b3c8-9f6bdeced846'],
    ['version 8', '5c146b14-3c52-8afd-938a-375d0df1fbf6'],
  ])('%s is a UUID but no UUIDv7', (_name, id) => {
    expect(validate(id)).toBe(true);
    expect(isUuid(id)).toBe(true);
    expect(isUuidV7(id)).toBe(false);
  });

  it.each([
    ['capitals', PUBLISHED_V7.toUpperCase()],
    ['another variant', '017f22e2-79b0-7cc3-c8c4-dc0c0c07398f'],
    ['braces', `{${PUBLISHED_V7}}`],
    ['a line break after it', `${PUBLISHED_V7}\n`],
    ['no text', 7],
  ])('with %s is not read', (_name, id) => {
    expect(isUuidV7(id)).toBe(false);
    expect(newIdSchema.safeParse(id).success).toBe(false);
  });
});

describe('UUIDv8 from a name', () => {
  it('is the published one for www.example.com (RFC 9562, appendix B.2)', () => {
    expect(computedId(DNS_NAMESPACE, 'www.example.com')).toBe('5c146b14-3c52-8afd-938a-375d0df1fbf6');
  });

  it('sets version and variant whatever the hash says', () => {
    expect(idFromSha256('f'.repeat(64))).toBe('ffffffff-ffff-8fff-bfff-ffffffffffff');
    expect(idFromSha256('0'.repeat(64))).toBe('00000000-0000-8000-8000-000000000000');
    expect(version(idFromSha256('f'.repeat(64)))).toBe(8);
    expect(parse(computedId(DNS_NAMESPACE, 'boat'))).toHaveLength(16);
  });
});

describe('SHA-256', () => {
  // FIPS 180-4 (the examples published with it)
  it.each([
    ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
    [
      'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
      '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
    ],
    [
      'abcdefghbcdefghicdefghijdefghijkefghijklfghijklmghijklmnhijklmnoijklmnopjklmnopqklmnopqrlmnopqrsmnopqrstnopqrstu',
      'cf5b16a778af8380036ce59e7b0492370b249b11e8f07a51afac45037afee9d1',
    ],
    ['a'.repeat(1_000_000), 'cdc76e5c9914fb9281a1c7e284d73e67f1809a48a497200e046d39ccc7112cd0'],
  ])('of the published message %#', (message, hash) => {
    expect(sha256Hex(message)).toBe(hash);
  });

  it('is of the UTF-8 bytes', () => {
    // by sha256sum of the bytes e2 82 ac
    expect(sha256Hex('€')).toBe('c4cc90ed3d26f12d4b08a75140970a7904035c31cbb4515a83f19b9003c00d1d');
  });
});
