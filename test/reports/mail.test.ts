import { describe, expect, test } from '@jest/globals';
import { squadWeekMail } from '../../reports/squad-week/squad-week.mail.ts';
import { changesSince, differences } from '../../reports/squad-week/changes.ts';
import { nameLimit } from '../../reports/squad-week/name-limit.ts';
import type { SquadWeekView } from '../../reports/squad-week/squad-week.view.ts';
import { inventedView, SIXTEEN } from './invented-squad.ts';
import type { Story } from './invented-squad.ts';

const first = { version: 1, change: null };
const squad = (...stories: Story[]) =>
  stories.map((story, i) => ({ name: `Athlete ${String.fromCharCode(65 + i)}`, story }));
const named = (view: SquadWeekView, text: string): string[] =>
  view.athletes.map(({ name }) => name).filter((name) => text.includes(name));

describe('mail', () => {
  test('the subject counts and names nobody', () => {
    const mail = squadWeekMail(inventedView(SIXTEEN), first);
    expect(mail.subject).toMatch(/^Women’s eight, week 48: \d of 16 needs? a talk$/);
    expect(mail.subject).not.toMatch(/ill|injur|sick|pain|return|fatigue/i);
    for (const { name } of SIXTEEN) expect(mail.subject).not.toContain(name);
  });

  test('nobody needs a talk can be the first sentence', () => {
    const mail = squadWeekMail(inventedView(squad('usual', 'old-test')), first);
    expect(mail.subject).toBe('Women’s eight, week 48: nobody needs a talk');
    expect(mail.text.split('\n\n')[1]).toBe('Nobody needs a talk.');
    const thin = squadWeekMail(inventedView(squad('new', 'new')), first);
    expect(thin.subject).toBe('Women’s eight, week 48: too thin a log to judge');
    expect(thin.text.split('\n\n')[1]).toBe('The log is too thin to say who needs a talk.');
    expect(thin.text).not.toMatch(/nobody needs/i);
  });

  test('at most three names for twenty athletes, the rest is counted', () => {
    const view = inventedView(squad('jump', 'jump', 'gap', 'jump', 'return', 'jump', 'old-test', 'usual'));
    const { text, html } = squadWeekMail(view, first);
    expect(named(view, text)).toHaveLength(3);
    expect(named(view, html)).toHaveLength(3);
    expect(view.headline).toBe(
      '4 of 8 need a talk: Athlete A, Athlete B, Athlete D and 1 more. Too thin a log to judge: 1 of 8.',
    );
    expect(text).toContain('Also noted: 4');
    expect([1, 16, 20, 21, 39, 40, 60].map(nameLimit)).toEqual([3, 3, 3, 3, 3, 6, 9]);
  });

  test('cautions stand in both parts; nothing remote, no script, names escaped', () => {
    const view = inventedView([{ name: '<img src=x onerror=alert(1)> & "Co"', story: 'jump' }]);
    const { text, html } = squadWeekMail(view, first);
    expect(view.cautions.length).toBeGreaterThan(5);
    for (const caution of view.cautions) expect(text).toContain(caution);
    for (const part of [text, html]) {
      expect(part).toContain('not a medical device and not a diagnosis');
      expect(part).toMatch(/guardian/i);
      expect(part).toMatch(/federation/i);
    }
    expect(html).toContain('&lt;img src=x onerror=alert(1)&gt; &amp; &quot;Co&quot;');
    expect(html).not.toMatch(/<img|<script|https?:|url\(|<link|@import/i);
  });

  test('a version says in subject and body that it is one, and what changed', () => {
    const mail = squadWeekMail(inventedView(squad('usual')), { version: 2, change: 'Athlete A: ratio 1.62 → 1.41' });
    expect(mail.subject).toContain('(version 2)');
    expect(mail.text).toContain('Version 2. Athlete A: ratio 1.62 → 1.41');
    expect(mail.html).toContain('Version 2. Athlete A: ratio 1.62 → 1.41');
  });
});

describe('since last Monday', () => {
  test('new, better and unchanged are told apart by athlete and kind', () => {
    const before = { ...inventedView(squad('jump', 'gap', 'usual')), isoWeek: '2026-W47' };
    const now = inventedView(squad('usual', 'gap', 'suspect'));
    expect(changesSince(before, now.measures, new Set())).toEqual({
      since: '2026-W47',
      fresh: ['Athlete C (doubtful reading)'],
      better: ['Athlete A (load concern)'],
      unchanged: ['Athlete B (gap in the log)'],
    });
    expect(changesSince(null, now.measures, new Set()).since).toBeNull();
  });

  test('nobody is better for having left, nor for figures that do not speak; raised again is new', () => {
    const before = { ...inventedView(squad('jump', 'gap')), isoWeek: '2026-W47' };
    const { measures } = inventedView(squad('usual', 'gap'));
    const silent = new Set([measures.find(({ name }) => name === 'Athlete A')!.athleteId]);
    expect(changesSince(before, measures, silent).better).toEqual([]);
    const remaining = measures.filter(({ name }) => name !== 'Athlete A');
    expect(changesSince(before, remaining, new Set()).better).toEqual([]);
    const again = measures.map((one) => ({
      ...one,
      flags: one.flags.map((flag) => ({ ...flag, since: '2026-11-28' })),
    }));
    expect(changesSince(before, again, new Set())).toMatchObject({
      fresh: ['Athlete B (gap in the log)'],
      unchanged: [],
    });
  });

  test('versions of one week are compared figure by figure', () => {
    const before = inventedView(squad('jump', 'usual'));
    const after = inventedView(squad('usual', 'usual'));
    const words = differences(before, after);
    expect(words).toMatch(/^Athlete A: load concern is gone, domain load \d+ → \d+, rating load \d+ → \d+, ratio/);
    expect(words).not.toContain('Athlete B');
    const many = differences(inventedView(squad('jump', 'jump', 'jump')), inventedView(squad('usual', 'usual')));
    expect(many).toMatch(/^Athlete A: .*; and 2 more athletes$/);
    expect(many).not.toContain('Athlete B');
  });
});
