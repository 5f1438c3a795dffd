import { describe, expect, it } from '@jest/globals';
import { readSheet } from '../../../src/features/sessions/session-sheet.ts';
import { columnOf, sheetSession } from '../../../src/features/sessions/sheet-session.ts';
import { ValidationError } from '../../../src/platform/errors.ts';

const header = 'athlete,startedAt,durationMin,modality';
const prague = () => 'Europe/Prague';

function fieldsOf(text: string) {
  try {
    readSheet(text);
  } catch (error) {
    if (error instanceof ValidationError) return error.fields;
    throw error;
  }
  throw new Error('the sheet was read');
}

describe('readSheet', () => {
  it('reads commas, semicolons and tabs, with a byte order mark and any line end', () => {
    for (const sign of [',', ';', '\t']) {
      for (const end of ['\n', '\r\n', '\r']) {
        const lines = [header, 'Nora,2026-03-01 07:30,60,rowing'].map((line) => line.replaceAll(',', sign));
        const sheet = readSheet(`\uFEFF${lines.join(end)}${end}`);
        expect(sheet.rows.map(({ cells }) => cells)).toEqual([
          { athlete: 'Nora', startedAt: '2026-03-01 07:30', durationMin: '60', modality: 'rowing' },
        ]);
        expect(sheet.decimalComma).toBe(sign !== ',');
      }
    }
  });

  it('keeps quoted separators, doubled quotes and text that looks like a formula as they are', () => {
    const sheet = readSheet(`title,${header}\n"=1+1, ""x"" @SUM(A1)",Nora,2026-03-01 07:30,60,rowing\n`);
    expect(sheet.rows[0]!.cells.title).toBe('=1+1, "x" @SUM(A1)');
  });

  it('numbers rows as the file’s lines and leaves empty lines and cells out', () => {
    const sheet = readSheet(`${header},rating\n\nNora,2026-03-01 07:30,60,rowing,\nIda,2026-03-01 07:30,60,rowing,5\n`);
    expect(sheet.rows.map(({ row, cells }) => [row, cells.athlete, cells.rating])).toEqual([
      [3, 'Nora', undefined],
      [4, 'Ida', '5'],
    ]);
  });

  it.each([
    ['', [1, '(whole sheet)']],
    [`${header}\n`, [2, '(whole sheet)']],
    [`${header},color\nNora,2026-03-01 07:30,60,rowing,red\n`, [1, 'color']],
    [`${header},modality\nNora,2026-03-01 07:30,60,rowing,rowing\n`, [1, 'modality']],
    ['athlete,startedAt,modality\nNora,2026-03-01 07:30,rowing\n', [1, 'durationMin']],
    [`${header}\nNora,2026-03-01 07:30,60\n`, [2, '(whole row)']],
    [`${header}\nNora,2026-03-01 07:30,60,"rowing\n`, [2, '(whole row)']],
    [`${header}\nNora,2026-03-01 07:30,60,row"ing\n`, [2, '(whole row)']],
  ])('refuses %j', (text, [row, field]) => {
    expect(fieldsOf(text)[0]).toMatchObject({ row, field });
  });
});

describe('sheetSession', () => {
  const cells = { athlete: 'Nora', startedAt: '2026-03-01 07:30', durationMin: '60', modality: 'rowing' };

  it('reads a wall time in the zone of that day, and instants as they are', () => {
    const start = (startedAt: string) => {
      const session = sheetSession({ row: 2, cells: { ...cells, startedAt } }, false, prague);
      return 'entry' in session ? session.entry.startedAt.toISOString() : session.errors;
    };
    expect(start('2026-03-01 07:30')).toBe('2026-03-01T06:30:00.000Z');
    expect(start('2026-07-01T07:30')).toBe('2026-07-01T05:30:00.000Z');
    expect(start('2026-07-01T07:30:00+05:30')).toBe('2026-07-01T02:00:00.000Z');
    expect(start('2026-03-02T07:30+01:00')).toBe('2026-03-02T06:30:00.000Z');
    expect(start('2026-03-02 07:30Z')).toBe('2026-03-02T07:30:00.000Z');
    expect(start('2026-02-30 07:30')).toEqual([expect.objectContaining({ row: 2, field: 'startedAt' })]);
    expect(start('1.3.2026 7:30')).toEqual([
      expect.objectContaining({ value: '1.3.2026 7:30', allowed: expect.stringContaining('2026-03-02 07:30') }),
    ]);
  });

  it('takes a decimal comma only where commas do not part fields', () => {
    const rated = { row: 2, cells: { ...cells, rating: '6,5' } };
    expect(sheetSession(rated, true, prague)).toMatchObject({ entry: { rating: 6.5, source: 'csv' } });
    expect(sheetSession(rated, false, prague)).toEqual({
      errors: [{ row: 2, field: 'rating', value: '6,5', allowed: 'a number from 0 to 10' }],
    });
  });

  it('makes domain minutes of their columns, missing ones 0', () => {
    expect(
      sheetSession({ row: 2, cells: { ...cells, moderateMin: '50', severeMin: '10' } }, false, prague),
    ).toMatchObject({
      entry: { content: { kind: 'domain-minutes', moderate: 50, heavy: 0, severe: 10, extreme: 0 } },
    });
  });

  it('names every wrong cell by its column with what is allowed', () => {
    const wrong = { ...cells, durationMin: '1e3', modality: 'chess', rating: '11', heavyMin: '-1', ratingBy: 'coach' };
    const session = sheetSession({ row: 7, cells: wrong }, false, prague);
    expect('errors' in session && session.errors.map(({ row, field, value }) => [row, field, value])).toEqual(
      expect.arrayContaining([
        [7, 'durationMin', '1e3'],
        [7, 'modality', 'chess'],
        [7, 'rating', 11],
        [7, 'heavyMin', -1],
        [7, 'ratingBy', 'coach'],
      ]),
    );
  });

  it('calls fields of a session by their column', () => {
    expect(['content.heavy', 'athleteId', 'durationMin'].map(columnOf)).toEqual(['heavyMin', 'athlete', 'durationMin']);
  });
});
