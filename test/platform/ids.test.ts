import { expect, test } from '@jest/globals';
import { newId } from '../../src/platform/ids.ts';

test('ids are version 7 and begin with their instant', () => {
  const id = newId(new Date('2026-03-02T05:00:00.123Z'));
  expect(id).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
  expect(parseInt(id.replaceAll('-', '').slice(0, 12), 16)).toBe(Date.parse('2026-03-02T05:00:00.123Z'));
});

test('ids made one after another sort in that order, under a clock that stands still too', () => {
  for (const instant of ['2026-03-02T05:00:00Z', '2026-03-02T05:00:00.001Z', '2026-03-01T05:00:00Z']) {
    const ids = Array.from({ length: 10_000 }, () => newId(new Date(instant)));
    expect(ids.toSorted()).toEqual(ids);
    expect(new Set(ids).size).toBe(ids.length);
  }
});
