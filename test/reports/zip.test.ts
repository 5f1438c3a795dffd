import { expect, test } from '@jest/globals';
import { readZip, writeZip } from '../../reports/workbook/zip.ts';

test('what is written is read again, names and bytes, and the same files give the same archive', () => {
  const entries = [
    { name: 'a/empty.txt', content: Buffer.alloc(0) },
    { name: 'Žluťoučký.bin', content: Buffer.from(Array.from({ length: 5000 }, (_, i) => i % 251)) },
  ];
  const archive = writeZip(entries);
  expect(readZip(archive)).toEqual(entries);
  expect(writeZip(entries).equals(archive)).toBe(true);
});

test('something else is refused', () => {
  expect(() => readZip(Buffer.from('no archive'))).toThrow('not a zip archive');
});
