import { join, relative, resolve } from 'node:path';
import { ApiClient } from '../../demo/api-client.ts';
import { localDay } from '../../demo/days.ts';
import { exportsOf } from '../../demo/exports.ts';
import { clubKey, foundClub } from '../../demo/found-club.ts';
import type { FoundClub } from '../../demo/found-club.ts';
import { KeyRing } from '../../demo/key-ring.ts';
import { logScenario } from '../../demo/log-scenario.ts';
import { scenario as scenarioOf } from '../../demo/scenario.ts';
import type { Scenario } from '../../demo/scenario.types.ts';
import { summaryOf } from '../../demo/summary.ts';
import { weeklyReport } from '../../demo/weekly-report.ts';
import type { MadeReport } from '../../demo/weekly-report.ts';
import type { Env } from '../../platform/env.ts';
import type { DemoArguments } from './arguments.ts';
import { progressLine } from './progress.ts';
import { told } from './told.ts';
import { writeWhole } from './write-files.ts';

export interface DemoRun {
  url: string;
  operatorKey: string;
  env: Env;
  signal: AbortSignal;
  say: (line: string) => void;
}

/** Logs the scenario into running services, has the report made and writes what the run is asked for. */
export async function runDemo(
  args: DemoArguments,
  { url, operatorKey, env, signal, say }: DemoRun,
): Promise<FoundClub> {
  const today = localDay(new Date(Date.now() + env.LOADWEIR_CLOCK_OFFSET_MS), 'Europe/Oslo');
  const scenario = scenarioOf(args.scenario, today);
  const api = new ApiClient(url, signal);
  const ring = new KeyRing(join(env.DATA_DIR, 'demo', 'tokens.json'), clubKey(scenario));
  const started = Date.now();
  const club = await foundClub(api, scenario, operatorKey, ring);
  const progress = progressLine(process.stderr);
  try {
    await logScenario(api, scenario, club, progress.show);
  } finally {
    progress.end();
  }
  const logging = (Date.now() - started) / 1000;
  const made = await weeklyReport(api, club, scenario.isoWeek);
  const files = await writeFiles(args, { api, env, scenario, club, made, today });
  for (const line of told(summaryOf(scenario, club, made.report, today, files), made, { logging })) say(line);
  return club;
}

interface ToWrite {
  api: ApiClient;
  env: Env;
  scenario: Scenario;
  club: FoundClub;
  made: MadeReport;
  today: string;
}

/** Workbook and mails always, with --exit also what an outside script computes the figures from; their names. */
async function writeFiles(args: DemoArguments, { api, env, scenario, club, made, today }: ToWrite): Promise<string[]> {
  const folder = resolve(args.out ?? env.OUTBOX_DIR);
  const shown = (file: string) => (args.exit ? relative(folder, file) : relative(process.cwd(), file));
  const workbook = join(folder, workbookName(made, scenario.number));
  writeWhole(workbook, made.workbook);
  const mails = made.deliveries.flatMap(({ detail }) => (detail?.endsWith('.eml') === true ? [detail] : []));
  const files = [workbook, ...mails].map(shown);
  if (!args.exit) return files;
  const exports = await exportsOf(api, scenario, club);
  files.push(...Object.keys(exports), 'summary.json');
  for (const [name, content] of Object.entries(exports)) writeWhole(join(folder, name), content);
  const summary = summaryOf(scenario, club, made.report, today, files);
  writeWhole(join(folder, 'summary.json'), `${JSON.stringify(summary, null, 2)}\n`);
  return files;
}

/** The name the service gave it; the squads of other scenarios are called the same. */
function workbookName({ report }: MadeReport, scenario: number): string {
  const name = report.files[0]!.name;
  return scenario === 1 ? name : name.replace(/\.xlsx$/, `-scenario-${scenario}.xlsx`);
}
