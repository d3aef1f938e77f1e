import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson, isSameJson } from '#shared/sync/canonical.ts';
import { sha256Hex } from '#shared/sync/ids.ts';

const parsed = (text: string): unknown => JSON.parse(text);

describe('canonical JSON (RFC 8785)', () => {
  // the RFC's author's test data, github.com/cyberphone/json-canonicalization at 19d51d7, testdata/
  it('of arrays, down to the hash of the published output', () => {
    const text = canonicalJson(parsed('[ 56, { "d": true, "10": null, "1": [ ] } ]'));
    expect(text).toBe('[56,{"1":[],"10":null,"d":true}]');
    expect(sha256Hex(text)).toBe('099601b171cafed97c333f8878d68e7f8c8f795412adb34b2fdcf0e7c7beac42');
  });

  it('of structures, whose keys are sorted by their UTF-16 units', () => {
    const text = canonicalJson(
      parsed(
        '{"1": {"f": {"f": "hi","F": 5} ,"\\n": 56.0},"10": { },"": "empty","a": { },"111": [{"e": "yes","E": "no" }],"A": { }}',
      ),
    );
    expect(text).toBe(
      '{"":"empty","1":{"\\n":56,"f":{"F":5,"f":"hi"}},"10":{},"111":[{"E":"no","e":"yes"}],"A":{},"a":{}}',
    );
    expect(text).toHaveLength(98);
    expect(sha256Hex(text)).toMatch(/^605f6500/);
  });

  it('of values: numbers as ECMAScript writes them', () => {
    const text = canonicalJson(
      parsed(
        '{"numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001], "literals": [null, true, false],' +
          '"string": "\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/"}',
      ),
    );
    expect(text).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
        '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
    expect(sha256Hex(text)).toMatch(/^2d5e01a3.*8baacb$/);
  });

  it('of weird names, sorted by UTF-16 units and not by characters', () => {
    // RFC 8785, section 3.2.3
    const text = canonicalJson({
      '\u20ac': 1,
      '\r': 2,
      '\ufb33': 3,
      '1': 4,
      '\ud83d\ude00': 5,
      '\u0080': 6,
      '\u00f6': 7,
    });
    expect(text).toBe('{"\\r":2,"1":4,"\u0080":6,"\u00f6":7,"\u20ac":1,"\ud83d\ude00":5,"\ufb33":3}');
  });

  it('of unicode: a letter and its ring stay two characters', () => {
    const text = canonicalJson(parsed('{"Unnormalized Unicode":"A\\u030a"}'));
    expect(text).toBe('{"Unnormalized Unicode":"A\u030a"}');
  });

  // RFC 8785, appendix B: IEEE 754 bits and the text of the number
  it.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['4340000000000000', '9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['444b1ae4d6e2ef50', '1e+21'],
    ['3eb0c6f7a0b5ed8c', '9.999999999999997e-7'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['41b3de4355555554', '333333333.33333325'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('of the number %s is %s', (bits, text) => {
    const view = new DataView(new ArrayBuffer(8));
    view.setBigUint64(0, BigInt(`0x${bits}`));
    expect(canonicalJson(view.getFloat64(0))).toBe(text);
  });

  it('falls back on plain JSON where there is no canonical text', () => {
    expect(canonicalJson({ b: '\ud800', a: 1 })).toBe('{"b":"\\ud800","a":1}');
  });

  it('is the same for the same value in any order of keys, and only then', () => {
    const reordered = (value: unknown): unknown => {
      if (Array.isArray(value)) return value.map(reordered);
      if (typeof value !== 'object' || value === null) return value;
      return Object.fromEntries(
        Object.entries(value)
          .reverse()
          .map(([key, inner]) => [key, reordered(inner)]),
      );
    };
    fc.assert(
      fc.property(fc.jsonValue({ noUnicodeString: false }), fc.jsonValue(), (value, other) => {
        const came = parsed(JSON.stringify(value));
        expect(isSameJson(came, reordered(came))).toBe(true);
        expect(isSameJson(came, other)).toBe(canonicalJson(came) === canonicalJson(other));
      }),
    );
  });
});
