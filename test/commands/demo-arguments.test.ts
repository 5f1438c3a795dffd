import { describe, expect, test } from '@jest/globals';
import { parseArguments } from '../../src/commands/demo/arguments.ts';
import { demoEnvironment } from '../../src/commands/demo/demo-environment.ts';
import { UsageError } from '../../src/commands/support/usage-error.ts';

describe('arguments of the demo', () => {
  test('are read in both spellings, with their defaults', () => {
    expect(parseArguments([])).toEqual({ help: false, exit: false, scenario: 1 });
    expect(parseArguments(['--exit', '--out', 'here', '--scenario=20', '--today', '2026-03-29'])).toEqual({
      ...{ help: false, exit: true, out: 'here', scenario: 20, today: '2026-03-29' },
    });
    expect(parseArguments(['-h']).help).toBe(true);
  });

  test.each([
    [['--scenario', '0'], /--scenario 0: allowed is a whole number from 1 to 20/],
    [['--scenario', '21'], /1 to 20/],
    [['--scenario', '1.5'], /1 to 20/],
    [['--today', '2026-02-30'], /--today 2026-02-30: allowed is a date like/],
    [['--today', '30.11.2026'], /allowed is a date/],
    [['--today', '1989-12-31'], /from 1990-01-01/],
    [['--out'], /--out needs a value/],
    [['--out', '--exit'], /--out needs a value/],
    [['--exit=yes'], /--exit takes no value/],
    [['--exit', '--exit'], /given twice/],
    [['--week', '3'], /unknown argument --week; allowed: --exit/],
    [['now'], /unknown argument now/],
  ])('%j is refused by name', (args, message) => {
    expect(() => parseArguments(args)).toThrow(UsageError);
    expect(() => parseArguments(args)).toThrow(message);
  });
});

describe('environment of the demo', () => {
  const given = {
    DATABASE_URL: 'postgresql://real',
    SMTP_URL: 'smtp://real',
    LOADWEIR_CLOCK_OFFSET_MS: '5',
    PORT: '3999',
    HOME: '/home/x',
  };

  test('never reaches a database or a mail server of the installation', () => {
    const args = parseArguments(['--today', '2026-11-30']);
    expect(demoEnvironment(given, args, {})).toEqual({
      ...{ HOME: '/home/x', PORT: '3999', LOADWEIR_MODE: 'demo', LOG_LEVEL: 'warn' },
      LOADWEIR_FIXED_TODAY: '2026-11-30',
    });
  });

  test('with --exit takes a free port and the folders of the run', () => {
    const environment = demoEnvironment(given, parseArguments(['--exit']), { data: '/d', outbox: '/o' });
    expect(environment).toMatchObject({ PORT: '0', DATA_DIR: '/d', OUTBOX_DIR: '/o', LOADWEIR_CLOCK_OFFSET_MS: '5' });
  });
});
