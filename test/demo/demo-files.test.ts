import { readdirSync, readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { simpleParser } from 'mailparser';
import { dayNumber } from '../../src/core/series/day.ts';
import { scenario } from '../../src/demo/scenario.ts';
import { daysOf } from './outside/days-of-log.ts';
import { figuresOf } from './outside/figures.ts';
import { readFiles } from './outside/read-files.ts';
import type { Files, SummaryAthlete } from './outside/read-files.ts';
import { runDemo } from './support/run-demo.ts';
import type { DemoOutput } from './support/run-demo.ts';
import { scenarioDays } from './support/scenario-days.ts';
import { viewOn } from './support/scenario-flags.ts';

const tuesday = '2026-12-01';
const workbookName = 'loadweir-senior-rowers-2026-W48-v1.xlsx';
let output: DemoOutput;
let files: Files;

beforeAll(async () => {
  output = await runDemo('--today', tuesday);
  files = readFiles(output.folder);
}, 300_000);

afterAll(() => output.remove());

/** The difference in units of the tolerance: 1e-6 of the value, or of 1. */
function off(shown: number | null | undefined, computed: number): number {
  if (shown === null || shown === undefined) return Number.isNaN(computed) ? 0 : Infinity;
  if (Number.isNaN(computed)) return Infinity;
  return Math.abs(shown - computed) / (1e-6 * Math.max(1, Math.abs(computed)));
}

/** Days from the flag's first day to the last Sunday. */
function flagsOf({ athletes, asOf }: Files['summary']) {
  return athletes.map(({ key, flags }) => ({
    key,
    flags: flags.map(({ kind, level, since }) => `${level} ${kind} ${dayNumber(asOf) - dayNumber(since)}`).sort(),
  }));
}

describe('the files of a run', () => {
  test('are all there and hold what they are named for', async () => {
    const names = readdirSync(output.folder).sort();
    expect(names).toEqual([
      ...[workbookName, 'log.csv', 'policy.json'],
      ...[expect.stringMatching(/^report-.*\.eml$/), 'summary.json', 'thresholds.csv'],
    ]);
    for (const name of names) expect(statSync(join(output.folder, name)).size).toBeGreaterThan(300);
    const mail = await simpleParser(
      readFileSync(
        join(
          output.folder,
          names.find((name) => name.endsWith('.eml'))!,
        ),
      ),
    );
    const workbook = readFileSync(join(output.folder, workbookName));
    expect(mail.attachments.some(({ content }) => content.equals(workbook))).toBe(true);
    expect(output.stdout).toContain(mail.to !== undefined && !Array.isArray(mail.to) ? mail.to.text : 'one recipient');
  });

  test('say of more than a thousand athlete-sessions that they were logged', () => {
    const summary = files.summary as Files['summary'] & { counts: { athletes: number; athleteSessions: number } };
    expect(summary.isoWeek).toBe('2026-W48');
    expect(summary.asOf).toBe('2026-11-29');
    expect(summary.counts.athletes).toBe(16);
    expect(summary.counts.athleteSessions).toBeGreaterThanOrEqual(1000);
  });

  test('give an outside computation every figure of the measures sheet', () => {
    expect(files.policy.settings).toMatchObject({
      ...{ primaryMeasure: 'domain-load', bound: { quantity: 'critical' } },
      ...{ ratio: { form: 'rolling-coupled' }, monotony: { sd: 'population' } },
    });
    const worst: Record<string, number> = {};
    const note = (figure: string, value: number) => (worst[figure] = Math.max(worst[figure] ?? 0, value));
    for (const shown of files.summary.athletes) {
      const days = daysOf(shown.key, files.log, files.thresholds, files.policy, files.summary.asOf);
      const computed = figuresOf(days);
      expect(shown.primaryMeasure).toBe(computed.primaryMeasure);
      Object.values(ordered(shown)).forEach((value, domain) =>
        note('domainMinutes', off(value, computed.domainMinutes[domain]!)),
      );
      note('domainLoad', off(shown.domainLoad.value, computed.domainLoad));
      note('domainLoad28', off(shown.domainLoad28.value, computed.domainLoad28));
      note('ratingLoad', off(shown.ratingLoad.value, computed.ratingLoad));
      note('ratio', off(shown.ratio.value, computed.ratio));
      note('monotony', off(shown.monotony.value, computed.monotony));
      note('strain', off(shown.strain.value, computed.strain));
      expect(Object.keys(shown.ratio.basisMix).sort()).toEqual(Object.keys(computed.basisMix).sort());
      for (const [basis, share] of Object.entries(computed.basisMix)) {
        note('basisMix', off(shown.ratio.basisMix[basis], share));
      }
      for (const [name, component] of [['longLoad', computed.long] as const, ['shortLoad', computed.short] as const]) {
        for (const part of ['value', 'low', 'high', 'units'] as const) {
          note(`${name}.${part}`, off(shown[name][part], component[part]));
        }
      }
    }
    expect(Object.entries(worst).filter(([, value]) => value > 1)).toEqual([]);
    expect(Object.keys(worst)).toHaveLength(16);
  });

  test('withhold a figure only with its reason', () => {
    for (const { ratio, monotony, strain, longLoad, shortLoad } of files.summary.athletes) {
      for (const figure of [ratio, monotony, strain, longLoad, shortLoad]) {
        if (figure.value === null) expect(figure.reason).toMatch(/\w/);
      }
    }
  });

  test('flag whom the core’s rules flag, leave the uneventful alone and rise no higher than a note', () => {
    const one = scenario(1, tuesday);
    const names: Record<string, string> = { within: 'planned-overload' };
    const expected = one.athletes.map(({ key }) => ({
      key,
      flags: viewOn(one, key, scenarioDays(one, key), 84)
        .flags.map(({ kind, sinceDaysAgo }) => `note ${names[kind] ?? kind} ${sinceDaysAgo}`)
        .sort(),
    }));
    expect(flagsOf(files.summary)).toEqual(expected);
    const quiet = new Set(one.athletes.filter(({ uneventful }) => uneventful).map(({ key }) => key));
    for (const { key, flags, ratio } of files.summary.athletes) {
      if (quiet.has(key)) expect({ key, flags, shown: ratio.value !== null }).toEqual({ key, flags: [], shown: true });
    }
  });
});

function ordered({ domainMinutes }: SummaryAthlete): number[] {
  return ['moderate', 'heavy', 'severe', 'extreme'].map((domain) => domainMinutes[domain]!);
}
