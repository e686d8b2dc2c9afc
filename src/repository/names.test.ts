import { expect, it } from 'vitest';
import { nameFromBytes, namesFromOutput, splitAtNul } from './names.ts';

it('reads NUL-separated names with blanks, quotes, line breaks and a byte-order mark as they are', () => {
  const names = [
    'a b.csv',
    'say "hi".csv',
    'two\nlines',
    'tab\there',
    'Größe/Fluß.csv',
    '\ufeffmarked',
    '\ufffd',
  ];
  expect(namesFromOutput(Buffer.from(names.map((name) => `${name}\0`).join('')))).toEqual(names);
});

it('reads no names from no bytes', () => {
  expect(namesFromOutput(Buffer.alloc(0))).toEqual([]);
  expect(splitAtNul(Buffer.alloc(0))).toEqual([]);
});

it('writes the bytes of a name that is not UTF-8 as \\xHH and leaves the names beside it alone', () => {
  const output = Buffer.concat([
    Buffer.from('Fluß\0'),
    Buffer.from([0x63, 0x61, 0x66, 0xe9, 0, 0xff, 0xfe, 0]),
  ]);
  expect(namesFromOutput(output)).toEqual(['Fluß', 'caf\\xe9', '\\xff\\xfe']);
  expect(nameFromBytes(Buffer.from('caf\xe9', 'latin1'))).toBe('caf\\xe9');
});

it('splits bytes at NUL, with or without one at the end', () => {
  expect(splitAtNul(Buffer.from('a\0bc\0')).map(String)).toEqual(['a', 'bc']);
  expect(splitAtNul(Buffer.from('a\0bc')).map(String)).toEqual(['a', 'bc']);
});
