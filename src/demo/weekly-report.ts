import { setTimeout as sleep } from 'node:timers/promises';
import type { ApiClient } from './api-client.ts';
import type { FoundClub } from './found-club.ts';
import type { ReportAnswer } from './report.types.ts';

export interface MadeReport {
  /** False where the week's report had been made and sent by an earlier run. */
  fresh: boolean;
  report: ReportAnswer;
  workbook: Buffer;
  deliveries: Delivery[];
}

export interface Delivery {
  email: string;
  messageId: string;
  state: 'waiting' | 'sent' | 'failed';
  /** The mail server's answer, or the file the mail was put into. */
  detail: string | null;
  sentAt: string | null;
}

interface Run {
  job: string;
  period: string;
  state: 'queued' | 'running' | 'done' | 'failed';
  note: string | null;
}

const job = 'weekly-report';
const patienceMs = 120_000;

/** Has the service's own weekly job run for a week, waits until the mail is out, and fetches what was made. */
export async function weeklyReport(api: ApiClient, club: FoundClub, isoWeek: string): Promise<MadeReport> {
  const token = club.tokens.get('manager')!;
  const squad = `/v1/squads/${club.squadId}`;
  const { queued } = await api.post<{ queued: boolean }>(`${squad}/job-runs`, {
    token,
    body: { job, period: isoWeek },
  });
  await until(async () => {
    const { items } = await api.get<{ items: Run[] }>(`${squad}/job-runs`, token);
    const run = items.find((one) => one.job === job && one.period === isoWeek);
    if (run?.state === 'failed') throw new Error(`The weekly report was not made: ${run.note ?? 'no reason given'}`);
    return run?.state === 'done';
  });
  const { items } = await api.get<{ items: { id: string; isoWeek: string; version: number }[] }>(
    `${squad}/reports`,
    token,
  );
  const newest = items
    .filter((one) => one.isoWeek === isoWeek)
    .reduce((best, one) => (one.version > best.version ? one : best));
  const path = `/v1/reports/${newest.id}`;
  return {
    fresh: queued,
    report: await api.get<ReportAnswer>(path, token),
    workbook: await api.bytes(`${path}/workbook`, token),
    deliveries: (await api.get<{ items: Delivery[] }>(`${path}/deliveries`, token)).items,
  };
}

async function until(condition: () => Promise<boolean>): Promise<void> {
  const deadline = Date.now() + patienceMs;
  while (!(await condition())) {
    if (Date.now() > deadline) throw new Error('The weekly report takes longer than two minutes.');
    await sleep(150);
  }
}
