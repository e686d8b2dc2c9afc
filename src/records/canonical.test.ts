import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { canonicalJson, sha256OfJson } from './canonical.ts';

describe('canonical JSON', () => {
  it('writes the sample of RFC 8785 section 3.2.2 as sections 3.2.3 and 3.2.4 do', () => {
    const sample = String.raw`{
      "numbers": [333333333.33333329, 1E30, 4.50, 2e-3, 0.000000000000000000000000001],
      "string": "\u20ac$\u000F\u000aA'\u0042\u0022\u005c\\\"\/",
      "literals": [null, true, false]
    }`;
    const written = String.raw`{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"€$\u000f\nA'B\"\\\\\"/"}`;
    expect(canonicalJson(JSON.parse(sample))).toBe(written);
    const octets =
      '7b226c69746572616c73223a5b6e756c6c2c747275652c66616c73655d2c226e756d62657273223a5b33333333333333' +
      '33332e333333333333332c31652b33302c342e352c302e3030322c31652d32375d2c22737472696e67223a22e282ac24' +
      '5c75303030665c6e4127425c225c5c5c5c5c222f227d';
    expect(Buffer.from(written).toString('hex')).toBe(octets);
  });

  it('orders the keys of RFC 8785 section 3.2.3 by UTF-16 code units', () => {
    const sample = String.raw`{
      "\u20ac": "Euro Sign",
      "\r": "Carriage Return",
      "\ufb33": "Hebrew Letter Dalet With Dagesh",
      "1": "One",
      "\ud83d\ude00": "Emoji: Grinning Face",
      "\u0080": "Control",
      "\u00f6": "Latin Small Letter O With Diaeresis"
    }`;
    const order = [...canonicalJson(JSON.parse(sample)).matchAll(/:"([^"]+)"/g)].map(([, value]) => value);
    expect(order).toEqual([
      'Carriage Return',
      'One',
      'Control',
      'Latin Small Letter O With Diaeresis',
      'Euro Sign',
      'Emoji: Grinning Face',
      'Hebrew Letter Dalet With Dagesh',
    ]);
  });

  // RFC 8785 appendix B: IEEE 754 bits and what is written for them.
  it.each([
    ['0000000000000000', '0'],
    ['8000000000000000', '0'],
    ['0000000000000001', '5e-324'],
    ['8000000000000001', '-5e-324'],
    ['7fefffffffffffff', '1.7976931348623157e+308'],
    ['4340000000000000', '9007199254740992'],
    ['4430000000000000', '295147905179352830000'],
    ['44b52d02c7e14af5', '9.999999999999997e+22'],
    ['44b52d02c7e14af6', '1e+23'],
    ['444b1ae4d6e2ef4e', '999999999999999700000'],
    ['3eb0c6f7a0b5ed8d', '0.000001'],
    ['41b3de4355555553', '333333333.3333332'],
    ['becbf647612f3696', '-0.0000033333333333333333'],
    ['43143ff3c1cb0959', '1424953923781206.2'],
  ])('writes the number with bits %s as %s', (bits, written) => {
    expect(canonicalJson(Buffer.from(bits, 'hex').readDoubleBE())).toBe(written);
  });

  it('refuses what JSON can’t hold (RFC 8785 section 3.2.2.3)', () => {
    expect(() => canonicalJson(Number.NaN)).toThrow();
    expect(() => canonicalJson(Number.POSITIVE_INFINITY)).toThrow();
  });

  it('does not depend on the order of keys', () => {
    fc.assert(
      fc.property(fc.dictionary(fc.string(), fc.jsonValue()), (object) => {
        const turned = Object.fromEntries(Object.entries(object).reverse());
        expect(sha256OfJson(turned)).toBe(sha256OfJson(object));
        expect(JSON.parse(canonicalJson(object))).toEqual(JSON.parse(JSON.stringify(object)));
      }),
    );
  });

  it('is SHA-256 of its bytes in UTF-8', () => {
    // GNU coreutils 9.1: `printf '{}' | sha256sum` and `printf '"ö€"' | sha256sum`.
    expect(sha256OfJson({})).toBe('44136fa355b3678a1146ad16f7e8649e94fb4fc21fe77e8310c060f61caaff8a');
    expect(sha256OfJson('ö€')).toBe('fac6cdac5ef08a97dc4d5dbbb629e14ac9221d2f1a331a6546e1c183ab553d4f');
  });
});
