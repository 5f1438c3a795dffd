import type { FoundClub } from './found-club.ts';
import type { AthleteMeasures, Cell, ReportAnswer } from './report.types.ts';
import type { Scenario } from './scenario.types.ts';

/** A figure unrounded, or null with the words that stand in its cell. */
interface Figure {
  value: number | null;
  reason?: string;
}

export type Summary = ReturnType<typeof summaryOf>;

/** The figures of the report as plain JSON, unrounded, for whoever computes them a second time. */
export function summaryOf(
  scenario: Scenario,
  club: FoundClub,
  report: ReportAnswer,
  today: string,
  files: readonly string[],
) {
  const keys = new Map([...club.athleteIds].map(([key, id]) => [id, key]));
  const { view } = report;
  return {
    scenario: scenario.number,
    club: scenario.club,
    squad: scenario.squad,
    zone: scenario.zone,
    today,
    isoWeek: report.isoWeek,
    asOf: report.asOf,
    headline: view.headline,
    counts: {
      athletes: scenario.athletes.length,
      athleteSessions: scenario.sessions.length,
      groupSessions: new Set(scenario.sessions.flatMap(({ group }) => group ?? [])).size,
      days: scenario.closings.length + unclosedDays(scenario),
      closedDays: scenario.closings.length,
      sessionsInWeek: view.line.sessionsDone,
      flagged: view.measures.filter(({ flags }) => flags.length > 0).length,
    },
    athletes: view.measures
      .map((measures) => athlete(keys.get(measures.athleteId) ?? '', measures))
      .sort((a, b) => a.key.localeCompare(b.key)),
    files: [...files],
  };
}

function athlete(key: string, measures: AthleteMeasures) {
  const { longLoad, shortLoad } = measures;
  const { moderate, heavy, severe, extreme } = measures.domainMinutes;
  return {
    key,
    name: measures.name,
    primaryMeasure: measures.primaryMeasure,
    primaryReason: measures.primaryReason,
    domainMinutes: { moderate, heavy, severe, extreme },
    domainLoad: { ...figure(measures.domainLoad.week), knownDays: measures.domainLoad.weekKnownDays },
    domainLoad28: { ...figure(measures.domainLoad.last28), knownDays: measures.domainLoad.last28KnownDays },
    ratingLoad: { ...figure(measures.ratingLoad.week), knownDays: measures.ratingLoad.weekKnownDays },
    ratio: {
      form: measures.ratio.form,
      ...figure(measures.ratio),
      knownDays: measures.ratio.knownDays,
      basisMix: measures.basisMix,
    },
    monotony: figure(measures.monotony),
    strain: figure(measures.strain),
    longLoad: { ...figure(longLoad), low: longLoad.low, high: longLoad.high, units: longLoad.units },
    shortLoad: { ...figure(shortLoad), low: shortLoad.low, high: shortLoad.high, units: shortLoad.units },
    withheld: measures.withheld,
    flags: measures.flags.map(({ kind, level, since, sentence, evidence }) => ({
      ...{ kind, level, since, sentence, evidence },
    })),
  };
}

function figure({ value, instead }: Cell): Figure {
  return value === null ? { value, reason: instead ?? 'withheld' } : { value };
}

function unclosedDays({ firstDay, lastSunday, closings }: Scenario): number {
  return Math.round((Date.parse(lastSunday) - Date.parse(firstDay)) / 86_400_000) + 1 - closings.length;
}
