// The invented squad as plain data; quantities and modalities are written as the HTTP interface spells them.

/** What makes an athlete's twelve weeks worth telling; 'twin' and 'late-threshold' change nothing a flag would see. */
export type CastRole =
  | 'drifting'
  | 'twin'
  | 'overload-over'
  | 'overload-now'
  | 'camp'
  | 'stale-thresholds'
  | 'ill'
  | 'rib'
  | 'gaps'
  | 'load-spike'
  | 'late-threshold';

export interface StaffMember {
  key: 'admin' | 'manager' | 'coach' | 'staff' | 'medic';
  name: string;
  email: string;
}

export interface ScenarioAthlete {
  key: string;
  name: string;
  email: string;
  sex: 'female' | 'male' | null;
  birthYear: number;
  roles: CastRole[];
  /** Nothing happens to this athlete that a flag should see. */
  uneventful: boolean;
  memberFrom: string;
}

export interface IntervalLine {
  repetitions: number;
  durationS: number;
  powerW?: number;
  heartRateBpm?: number;
  recoveryS?: number;
  recoveryPowerW?: number;
}

export interface StrengthSet {
  exercise: string;
  sets: number;
  repetitions: number;
  loadKg: number;
}

export interface DomainMinutesContent {
  kind: 'domain-minutes';
  moderate: number;
  heavy: number;
  severe: number;
  extreme: number;
}

export type SessionContent =
  { kind: 'intervals'; lines: IntervalLine[] } | { kind: 'strength'; sets: StrengthSet[] } | DomainMinutesContent;

/** One athlete's session; those of one group were trained and logged together. */
export interface ScenarioSession {
  externalId: string;
  athlete: string;
  group: string | null;
  day: string;
  startedAt: string;
  durationMin: number;
  modality: 'rowing' | 'cycling' | 'running' | 'strength';
  setting: 'ergometer' | 'water' | 'road' | 'gym';
  kind: 'training' | 'competition' | 'test';
  title: string;
  distanceM?: number;
  rating?: number;
  ratingBy?: 'athlete' | 'staff';
  ratingDelayMin?: number;
  intendedRating?: number;
  meanHeartRateBpm?: number;
  content?: SessionContent;
}

export interface ThresholdEntry {
  quantity: string;
  modality?: string;
  setting?: string;
  value: number;
  standardError?: number;
  method: string;
  validFrom: string;
}

export interface ThresholdBatch {
  athlete: string;
  /** Late: entered after the sessions it touches. */
  late: boolean;
  values: ThresholdEntry[];
}

export interface AvailabilityEntry {
  athlete: string;
  state: 'modified' | 'none';
  cause: 'illness' | 'complaint';
  reason: string;
  allowedModalities?: string[];
  from: string;
  to: string;
}

export interface Closing {
  day: string;
  unknown: string[];
}

export interface ZonePeriodEntry {
  athlete: string;
  zone: string;
  from: string;
  to: string;
}

export interface LoadPeriodEntry {
  athlete: string | null;
  purpose: 'overload' | 'unload' | 'taper';
  from: string;
  to: string;
  note: string;
}

export interface Scenario {
  number: number;
  /** Monday of the first and Sunday of the last of the twelve weeks. */
  firstDay: string;
  lastSunday: string;
  isoWeek: string;
  zone: string;
  club: string;
  squad: string;
  staff: StaffMember[];
  athletes: ScenarioAthlete[];
  sessions: ScenarioSession[];
  thresholds: ThresholdBatch[];
  availability: AvailabilityEntry[];
  closings: Closing[];
  zonePeriods: ZonePeriodEntry[];
  loadPeriods: LoadPeriodEntry[];
}
