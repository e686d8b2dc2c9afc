import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { blobsOfOthers, blobsOfPart, isKeyOfPart, parsePart, partName } from './part.ts';

const parts = (of: number) => Array.from({ length: of }, (_, place) => ({ number: place + 1, of }));

describe('a part', () => {
  it.each(['1of1', '2of8', '256of256'])('is read as it is written: %s', (text) => {
    const part = parsePart(text);
    expect(part && partName(part)).toBe(text);
  });
  it.each(['', '0of1', '2of1', '1of0', '01of2', '1of257', '1/2', '1 of 2', '-1of2', '1of2of3'])(
    'is not %j',
    (text) => expect(parsePart(text)).toBeNull(),
  );
});

const hexadecimal = (length: number) =>
  fc.string({ unit: fc.constantFrom(...'0123456789abcdef'), minLength: length, maxLength: length });

const someSizes = fc
  .uniqueArray(fc.tuple(hexadecimal(8), fc.nat(1_000_000)), {
    selector: ([id]) => id,
  })
  .map((entries) => new Map(entries));

describe('blobs', () => {
  it('go each to one part, whatever order they are listed in', () => {
    fc.assert(
      fc.property(someSizes, fc.integer({ min: 1, max: 9 }), (sizes, of) => {
        const shares = parts(of).map((part) => blobsOfPart(sizes, part));
        expect(shares.flatMap((share) => [...share]).sort()).toEqual([...sizes.keys()].sort());
        const reversed = new Map([...sizes].reverse());
        expect(parts(of).map((part) => blobsOfPart(reversed, part))).toEqual(shares);
      }),
    );
  });

  it('make loads that differ by no more than the largest of them', () => {
    fc.assert(
      fc.property(someSizes, fc.integer({ min: 1, max: 9 }), (sizes, of) => {
        const loads = parts(of).map((part) =>
          [...blobsOfPart(sizes, part)].reduce((sum, id) => sum + (sizes.get(id) ?? 0), 0),
        );
        expect(Math.max(...loads) - Math.min(...loads)).toBeLessThanOrEqual(Math.max(0, ...sizes.values()));
      }),
    );
  });

  it('are left to others where these read them: neither small ones nor missing ones', async () => {
    const sizes = new Map([
      ['aa', 5000],
      ['bb', 4000],
      ['cc', 1023],
      ['dd', 1024],
    ]);
    const blobs = { sizes: async () => sizes };
    const ids = [...sizes.keys(), 'missing'];
    // aa | bb, then dd and cc go to the second, which has less.
    expect(await blobsOfOthers(ids, { number: 1, of: 2 }, blobs)).toEqual(
      new Map([
        ['bb', 4000],
        ['dd', 1024],
      ]),
    );
    expect(await blobsOfOthers(ids, { number: 2, of: 2 }, blobs)).toEqual(new Map([['aa', 5000]]));
  });
});

it('a value belongs to one part', () => {
  fc.assert(
    fc.property(hexadecimal(64), fc.integer({ min: 1, max: 256 }), (key, of) => {
      expect(parts(of).filter((part) => isKeyOfPart(key, part))).toHaveLength(1);
    }),
  );
});
