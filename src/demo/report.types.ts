// The parts of a report's answer that the summary reads, as the HTTP interface gives them.

export interface ReportAnswer {
  id: string;
  isoWeek: string;
  version: number;
  asOf: string;
  madeAt: string;
  files: { name: string }[];
  view: ReportView;
}

export interface ReportView {
  headline: string;
  talk: string[];
  line: { sessionsDone: number; closedDays: number; closedOf: number };
  athletes: AthleteLine[];
  measures: AthleteMeasures[];
  cautions: string[];
}

export interface Cell {
  value: number | null;
  instead: string | null;
}

export interface AthleteLine {
  athleteId: string;
  name: string;
  availability: string;
  level: string;
  sentence: string;
  since: string | null;
  ask: string;
}

export interface KnownDays {
  acute: number;
  acuteOf: number;
  chronic: number;
  chronicOf: number;
}

export interface ComponentCell extends Cell {
  low: number | null;
  high: number | null;
  units: number | null;
}

export interface AthleteMeasures {
  athleteId: string;
  name: string;
  primaryMeasure: string;
  primaryReason: string;
  domainMinutes: { moderate: number; heavy: number; severe: number; extreme: number };
  domainLoad: { week: Cell; weekKnownDays: number; last28: Cell; last28KnownDays: number };
  ratingLoad: { week: Cell; weekKnownDays: number };
  ratio: Cell & { form: string; knownDays: KnownDays };
  monotony: Cell;
  strain: Cell;
  longLoad: ComponentCell;
  shortLoad: ComponentCell;
  basisMix: Record<string, number>;
  withheld: string[];
  flags: { kind: string; level: string; since: string; sentence: string; evidence: unknown }[];
}
