import type { Heart, Power, Tested } from './physiology.ts';
import type { IntervalLine, ScenarioSession, StrengthSet } from './scenario.types.ts';

/** How hard a piece is, between the athlete's own bounds and never near one of them. */
export type Effort = 'easy' | 'steady' | 'tempo' | 'hard' | 'sprint';

export interface Piece {
  repetitions: number;
  minutes: number;
  effort: Effort;
  recoveryMin?: number;
}

export interface Recipe {
  title: string;
  modality: ScenarioSession['modality'];
  setting: ScenarioSession['setting'];
  kind: ScenarioSession['kind'];
  /** 'power' and 'heart': what the lines are given in. */
  measuredBy: 'power' | 'heart' | 'sets';
  time: string;
  logged: 'group' | 'own';
  /** The session rating it usually gets. */
  rating: number;
  pieces: readonly Piece[];
  /** Strength only. */
  minutes?: number;
  exercises?: readonly string[];
}

const piece = (repetitions: number, minutes: number, effort: Effort, recoveryMin?: number): Piece =>
  recoveryMin === undefined ? { repetitions, minutes, effort } : { repetitions, minutes, effort, recoveryMin };

const water = { modality: 'rowing', setting: 'water', kind: 'training', measuredBy: 'heart', logged: 'group' } as const;
const erg = { modality: 'rowing', setting: 'ergometer', kind: 'training', measuredBy: 'power' } as const;
const bike = { modality: 'cycling', setting: 'ergometer', kind: 'training', measuredBy: 'power' } as const;
const run = { modality: 'running', setting: 'road', kind: 'training', measuredBy: 'heart', logged: 'own' } as const;
const strength = { modality: 'strength', setting: 'gym', kind: 'training', measuredBy: 'sets', pieces: [] } as const;

const sprints = piece(6, 0.25, 'sprint', 0.75);

export const recipes = {
  'water-steady': {
    ...water, title: 'Steady rowing, technique', time: '07:00', rating: 3,
    pieces: [piece(1, 10, 'easy'), piece(3, 16, 'steady', 2), piece(1, 8, 'easy')],
  },
  'water-pieces': {
    ...water, title: 'Tempo and race pieces on the water', time: '07:00', rating: 7,
    pieces: [piece(1, 15, 'easy'), piece(3, 10, 'tempo', 3), piece(3, 4, 'hard', 4), piece(1, 10, 'easy')],
  },
  'water-long': {
    ...water, title: 'Long row', time: '07:30', rating: 4,
    pieces: [piece(1, 10, 'easy'), piece(2, 45, 'steady', 4), piece(1, 10, 'easy')],
  },
  'erg-intervals': {
    ...erg, logged: 'group', title: 'Ergometer, 6 hard pieces', time: '06:45', rating: 7,
    pieces: [piece(1, 15, 'easy'), piece(6, 5, 'hard', 3), piece(1, 10, 'easy')],
  },
  'erg-tempo': {
    ...erg, logged: 'group', title: 'Ergometer, tempo', time: '16:00', rating: 6,
    pieces: [piece(1, 12, 'easy'), piece(3, 12, 'tempo', 3), piece(1, 8, 'easy')],
  },
  'erg-test': {
    ...erg, kind: 'test', logged: 'group', title: 'Step test and maximal efforts', time: '06:45', rating: 8,
    pieces: [piece(1, 15, 'easy'), piece(4, 4, 'steady', 1), piece(2, 4, 'tempo', 1), piece(3, 5, 'hard', 6)],
  },
  'bike-easy': {
    ...bike, logged: 'own', title: 'Easy ride with short sprints', time: '10:30', rating: 2.5,
    pieces: [piece(1, 44, 'steady'), sprints],
  },
  'bike-intervals': {
    ...bike, logged: 'own', title: 'Ride with tempo pieces', time: '10:30', rating: 6,
    pieces: [piece(1, 15, 'easy'), piece(4, 8, 'tempo', 3), piece(1, 10, 'easy')],
  },
  'bike-long': {
    ...bike, logged: 'own', title: 'Long ride', time: '09:00', rating: 4, pieces: [piece(1, 100, 'steady')],
  },
  'bike-sunday': {
    ...bike, logged: 'own', title: 'Sunday ride', time: '10:00', rating: 2.5, pieces: [piece(1, 48, 'easy')],
  },
  'run-easy': { ...run, title: 'Easy run', time: '17:30', rating: 2.5, pieces: [piece(1, 44, 'easy')] },
  'run-sunday': { ...run, title: 'Sunday run', time: '10:00', rating: 3, pieces: [piece(1, 45, 'steady')] },
  'strength-whole': {
    ...strength, logged: 'group', title: 'Strength, whole body', time: '16:30', rating: 5, minutes: 55,
    exercises: ['deadlift', 'bench pull', 'leg press', 'pull-up'],
  },
  'strength-trunk': {
    ...strength, logged: 'group', title: 'Strength, trunk and legs', time: '16:30', rating: 4.5, minutes: 45,
    exercises: ['squat', 'bench row', 'split squat'],
  },
} as const satisfies Record<string, Recipe>; // prettier-ignore

export type Slot = keyof typeof recipes;

/** The lines of a session, its pieces lengthened or shortened; recoveries stay. */
export function linesOf(recipe: Recipe, test: Tested, scale: number): IntervalLine[] {
  return recipe.pieces.map(({ repetitions, minutes, effort, recoveryMin }) => ({
    repetitions,
    durationS: effort === 'sprint' ? minutes * 60 : Math.max(180, Math.round(minutes * 6 * scale) * 10),
    ...intensity(recipe, test, effort),
    ...(recoveryMin === undefined ? {} : { recoveryS: recoveryMin * 60 }),
  }));
}

/** Minutes the lines take, each repetition with its recovery. */
export function minutesOf(lines: readonly IntervalLine[]): number {
  return lines.reduce((sum, line) => sum + (line.repetitions * (line.durationS + (line.recoveryS ?? 0))) / 60, 0);
}

/** Mean heart rate over the lines; recoveries are taken 12 beats below the work. */
export function meanHeartRate(lines: readonly IntervalLine[]): number {
  const beats = lines.reduce((sum, { repetitions, durationS, recoveryS = 0, heartRateBpm = 0 }) => {
    return sum + (repetitions * (durationS * heartRateBpm + recoveryS * (heartRateBpm - 12))) / 60;
  }, 0);
  return Math.round(beats / minutesOf(lines));
}

export function setsOf(recipe: Recipe, strongness: number): StrengthSet[] {
  return (recipe.exercises ?? []).map((exercise, index) => ({
    exercise,
    sets: 4,
    repetitions: index % 2 === 0 ? 6 : 8,
    loadKg: 2.5 * Math.round((50 + 15 * (index % 3)) * strongness * 0.4),
  }));
}

function intensity(recipe: Recipe, test: Tested, effort: Effort): Pick<IntervalLine, 'powerW' | 'heartRateBpm'> {
  if (recipe.measuredBy === 'heart') {
    return { heartRateBpm: beats(recipe.modality === 'running' ? test.running : test.rowing, effort) };
  }
  return { powerW: watts(recipe.modality === 'cycling' ? test.cycling : test.rowing, effort) };
}

function watts({ lt1W, criticalW, wPrimeJ }: Power, effort: Effort): number {
  const at: Record<Effort, number> = {
    easy: 0.8 * lt1W,
    steady: 0.92 * lt1W,
    tempo: (lt1W + criticalW) / 2,
    hard: 1.07 * criticalW,
    // W′ is spent in less than 100 s: beyond the extreme bound.
    sprint: criticalW + wPrimeJ / 100,
  };
  return Math.round(at[effort]);
}

function beats({ lt1Bpm, lt2Bpm, maxBpm }: Heart, effort: Effort): number {
  const at: Record<Effort, number> = {
    easy: lt1Bpm - 15,
    steady: lt1Bpm - 6,
    tempo: (lt1Bpm + lt2Bpm) / 2,
    hard: lt2Bpm + 0.45 * (maxBpm - lt2Bpm),
    sprint: maxBpm - 1,
  };
  return Math.round(at[effort]);
}
