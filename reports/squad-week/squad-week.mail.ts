import { KIND_WORDS } from './changes.ts';
import { nameLimit } from './name-limit.ts';
import { LEVEL_WORDS, longDate, squadLine, weekWords } from './squad-week.view.ts';
import type { AthleteLine, Edition, SquadWeekView } from './squad-week.view.ts';

export interface Mail {
  subject: string;
  text: string;
  html: string;
}

/** The mail of a week: the most important things in thirty seconds, the rest counted, the workbook attached. */
export function squadWeekMail(view: SquadWeekView, edition: Edition): Mail {
  const content = contentOf(view, edition);
  return { subject: subject(view, edition), text: asText(content), html: asHtml(content) };
}

interface Content {
  title: string;
  headline: string;
  edition: string | null;
  items: { name: string; level: string; sentence: string; ask: string }[];
  also: string;
  since: string;
  line: string;
  asOf: string;
  cautions: string[];
}

/** No health words and no names: a subject is read on locked screens. */
function subject(view: SquadWeekView, { version }: Edition): string {
  const count = view.talk.length;
  const who =
    view.asOf === null
      ? 'no day closed yet'
      : count === 0
        ? view.unjudged === view.athletes.length
          ? 'too thin a log to judge'
          : 'nobody needs a talk'
        : `${count} of ${view.athletes.length} ${count === 1 ? 'needs' : 'need'} a talk`;
  const name = view.squad.name.replaceAll(/\s+/g, ' ');
  return `${name}, ${weekWords(view.isoWeek)}: ${who}${version > 1 ? ` (version ${version})` : ''}`;
}

function contentOf(view: SquadWeekView, { version, change }: Edition): Content {
  const flagged = view.athletes.filter(({ level }) => level !== 'none');
  const items = [...flagged]
    .sort((a, b) => weight(view, a) - weight(view, b))
    .slice(0, nameLimit(view.athletes.length));
  const rest = flagged.length - items.length;
  const { changes } = view;
  return {
    title: `${view.squad.name}, ${weekWords(view.isoWeek)}`,
    headline: view.headline,
    edition: version > 1 ? `Version ${version}. ${change ?? ''}`.trim() : null,
    items: items.map((line) => ({
      name: line.name,
      level: LEVEL_WORDS[line.level],
      sentence: line.sentence,
      ask: line.ask,
    })),
    also: rest > 0 ? `Also noted: ${rest} (see the workbook).` : '',
    since:
      changes.since === null
        ? 'No report of the week before to compare with.'
        : `Since last Monday: ${changes.fresh.length} new, ${changes.better.length} better, ${changes.unchanged.length} unchanged.`,
    line: squadLine(view),
    asOf:
      view.asOf === null ? 'No day is closed yet.' : `All figures end on ${longDate(view.asOf)}, the last closed day.`,
    cautions: view.cautions,
  };
}

/** Those who need a talk first, then by the kind of their first flag; the order of the sheet decides the rest. */
function weight(view: SquadWeekView, line: AthleteLine): number {
  const first = view.measures.find(({ athleteId }) => athleteId === line.athleteId)?.flags[0]?.kind ?? '';
  const kinds = Object.keys(KIND_WORDS);
  return (line.talk ? 0 : 10_000) + 100 * kinds.indexOf(first) + 0.01 * view.athletes.indexOf(line);
}

function asText(content: Content): string {
  const items = content.items.map(
    ({ name, level, sentence, ask }, i) => `${i + 1}. ${name} (${level})\n   ${sentence}\n   ${ask}.`,
  );
  return [
    content.title,
    content.headline,
    content.edition,
    ...items,
    content.also,
    content.since,
    content.line,
    content.asOf,
    'The workbook is attached: first sheet for the week, second for the measures, one sheet for every flagged athlete.',
    ['Please keep in mind:', ...content.cautions.map((caution) => `- ${caution}`)].join('\n'),
  ]
    .filter((part) => part !== null && part !== '')
    .join('\n\n')
    .concat('\n');
}

const FONT = 'font-family:Arial,Helvetica,sans-serif;color:#1F2933';

function asHtml(content: Content): string {
  const paragraph = (words: string, style = ''): string =>
    words === ''
      ? ''
      : `<p style="${FONT};font-size:14px;line-height:1.45;margin:0 0 12px;${style}">${escape(words)}</p>`;
  const items = content.items.map(
    ({ name, level, sentence, ask }) =>
      `<tr><td style="${FONT};font-size:14px;line-height:1.45;padding:10px 14px;border-left:4px solid #0072B2;background:#F4F7FA">` +
      `<strong>${escape(name)}</strong> <span style="color:#0072B2">${escape(level)}</span><br>${escape(sentence)}<br>` +
      `<strong>${escape(ask)}.</strong></td></tr><tr><td style="height:8px;line-height:8px;font-size:0">&nbsp;</td></tr>`,
  );
  const cautions = content.cautions.map((caution) => `<li style="margin:0 0 4px">${escape(caution)}</li>`).join('');
  return [
    '<!doctype html><html lang="en"><head><meta charset="utf-8"><meta name="viewport" content="width=device-width">',
    `<title>${escape(content.title)}</title></head><body style="margin:0;padding:24px;background:#ffffff">`,
    '<table role="presentation" cellpadding="0" cellspacing="0" border="0" style="max-width:640px;width:100%"><tr><td>',
    paragraph(content.title, 'color:#4B5563;margin-bottom:4px'),
    `<h1 style="${FONT};font-size:22px;line-height:1.3;margin:0 0 16px">${escape(content.headline)}</h1>`,
    content.edition === null ? '' : paragraph(content.edition, 'font-weight:bold'),
    items.length === 0
      ? ''
      : `<table role="presentation" cellpadding="0" cellspacing="0" border="0" width="100%">${items.join('')}</table>`,
    paragraph(content.also),
    paragraph(content.since),
    paragraph(content.line),
    paragraph(content.asOf),
    paragraph(
      'The workbook is attached: first sheet for the week, second for the measures, one sheet for every flagged athlete.',
    ),
    `<p style="${FONT};font-size:12px;margin:16px 0 4px;color:#4B5563">Please keep in mind:</p>`,
    `<ul style="${FONT};font-size:12px;line-height:1.4;color:#4B5563;margin:0;padding-left:18px">${cautions}</ul>`,
    '</td></tr></table></body></html>',
  ].join('\n');
}

function escape(words: string): string {
  return words
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;');
}
