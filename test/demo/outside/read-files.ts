import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';

// Nothing in this folder uses the project's own code: it computes the report's figures a second time from the files.

export type Row = Record<string, string>;

export interface Policy {
  settings: {
    primaryMeasure: string;
    weights: { moderate: number; heavy: number; severe: number; extreme: number };
    bound: { quantity: string };
    ratio: { form: string };
    monotony: { sd: string };
  };
}

export interface Files {
  log: Row[];
  thresholds: Row[];
  policy: Policy;
  summary: { isoWeek: string; asOf: string; athletes: SummaryAthlete[] };
}

interface Figure {
  value: number | null;
  reason?: string;
}

type Component = Figure & { low: number | null; high: number | null; units: number | null };

export interface SummaryAthlete {
  key: string;
  primaryMeasure: string;
  domainMinutes: Record<string, number>;
  domainLoad: Figure & { knownDays: number };
  domainLoad28: Figure & { knownDays: number };
  ratingLoad: Figure & { knownDays: number };
  ratio: Figure & { form: string; knownDays: Record<string, number>; basisMix: Record<string, number> };
  monotony: Figure;
  strain: Figure;
  longLoad: Component;
  shortLoad: Component;
  flags: { kind: string; level: string; since: string }[];
}

export function readFiles(folder: string): Files {
  const text = (name: string) => readFileSync(join(folder, name), 'utf8');
  const table = (name: string) => parse(text(name), { columns: true, skip_empty_lines: true });
  return {
    log: table('log.csv') as Row[],
    thresholds: table('thresholds.csv') as Row[],
    policy: JSON.parse(text('policy.json')) as Policy,
    summary: JSON.parse(text('summary.json')) as Files['summary'],
  };
}
