import type { Policy, Row } from './read-files.ts';

/** One athlete's day: loads are NaN where the day is not wholly known, `least` is what is known of it. */
export interface Day {
  date: string;
  domain: { known: boolean; value: number };
  rating: { known: boolean; value: number };
  minutes: number[];
  /** Minutes to which domain load applies, and those counted, by what they were counted from. */
  applicable: number;
  counted: Record<string, number>;
  unavailable: boolean;
}

const dayMs = 86_400_000;

export function isoDate(time: number): string {
  return new Date(time).toISOString().slice(0, 10);
}

/** Every day from the first closed or trained one to `last`. */
export function daysOf(athlete: string, log: Row[], thresholds: Row[], policy: Policy, last: string): Day[] {
  const mine = log.filter((row) => row.athlete === athlete);
  const sessions = mine.filter(({ type }) => type === 'session');
  const closings = new Set(log.filter(({ type }) => type === 'closing').map(({ day }) => day!));
  const unknown = new Set(mine.filter(({ type }) => type === 'unknown').map(({ day }) => day!));
  const out = mine.filter(({ type, availability }) => type === 'availability' && availability === 'none');
  const member = mine.find(({ type }) => type === 'membership')!.from!;
  const first = [...closings, ...sessions.map(({ day }) => day!)].filter((day) => day >= member).sort()[0]!;
  const own = thresholds.filter((row) => row.athlete === athlete && row.withdrawnAt === '');
  const days: Day[] = [];
  for (let time = Date.parse(first); isoDate(time) <= last; time += dayMs) {
    const date = isoDate(time);
    const done = sessions.filter(({ day }) => day === date);
    const weighed = done.map((session) => {
      const lines = mine.filter((row) => row.type === 'interval' && row.externalId === session.externalId);
      return { session, ...weigh(session, lines, own) };
    });
    const closed = closings.has(date) && !unknown.has(date);
    const unavailable = out.some(({ from, to }) => from! <= date && date <= to!);
    const weights = policy.settings.weights;
    const loads = weighed.map(({ minutes, applies }) => {
      if (!applies) return 0;
      if (minutes === null) return NaN;
      return (
        weights.moderate * minutes[0]! +
        weights.heavy * minutes[1]! +
        weights.severe * minutes[2]! +
        weights.extreme * minutes[3]!
      );
    });
    const rated = done.map(({ rating, durationMin }) => (rating === '' ? NaN : Number(rating) * Number(durationMin)));
    const counted: Record<string, number> = {};
    const minutes = [0, 0, 0, 0];
    for (const one of weighed) {
      if (one.minutes === null || !one.applies) continue;
      counted[one.basis] = (counted[one.basis] ?? 0) + one.minutes.reduce((sum, value) => sum + value, 0);
      one.minutes.forEach((value, domain) => (minutes[domain]! += value));
    }
    days.push({
      date,
      domain: sumOf(loads, closed, unavailable),
      rating: sumOf(rated, closed, unavailable),
      minutes,
      applicable: weighed
        .filter(({ applies }) => applies)
        .reduce((sum, one) => sum + Number(one.session.durationMin), 0),
      counted,
      unavailable,
    });
  }
  return days;
}

function sumOf(loads: number[], closed: boolean, unavailable: boolean) {
  if (loads.length === 0) return { known: closed || unavailable, value: closed || unavailable ? 0 : NaN };
  const sum = loads.reduce((total, load) => total + (Number.isNaN(load) ? 0 : load), 0);
  return { known: closed && !loads.some(Number.isNaN), value: sum };
}

/** Minutes moderate, heavy, severe, extreme of one session; null where too little is told. */
function weigh(session: Row, lines: Row[], thresholds: Row[]) {
  if (session.modality === 'strength') return { applies: false, minutes: null, basis: '' };
  if (lines.length === 0) return { applies: true, minutes: null, basis: '' };
  const value = (quantity: string) => inForce(thresholds, quantity, session);
  const power = lines.every(({ powerW }) => powerW !== '');
  const lower = power ? value('lt1-power') : value('lt1-heart-rate');
  const upper = power ? value('critical-power') : value('lt2-heart-rate');
  // Hill 2002: in cycling the severe domain ends where the work above critical power lasts 136 s.
  const top = power && session.modality === 'cycling' ? upper + value('w-prime') / 136 : Infinity;
  const minutes = [0, 0, 0, 0];
  let told = 0;
  let unassigned = 0;
  for (const line of lines) {
    const times = Number(line.repetitions);
    const work = Number(line.durationS) / 60;
    const rest = Number(line.recoveryS || 0) / 60;
    const intensity = Number(power ? line.powerW : line.heartRateBpm);
    told += times * (work + rest);
    minutes[0]! += times * rest;
    if (!power && work < 3) unassigned += times * work;
    else minutes[intensity <= lower ? 0 : intensity <= upper ? 1 : intensity <= top ? 2 : 3]! += times * work;
  }
  const duration = Number(session.durationMin);
  unassigned += Math.max(0, duration - told);
  const enough = unassigned <= 0.1 * duration + 1e-9;
  return { applies: true, minutes: enough ? minutes : null, basis: power ? 'interval' : 'heart-rate' };
}

/** The session's setting first, then any; of these the newest not of a later date. */
function inForce(thresholds: Row[], quantity: string, { modality, setting, day }: Row): number {
  for (const place of [setting, 'any']) {
    const values = thresholds
      .filter((row) => row.quantity === quantity && row.modality === modality && row.setting === place)
      .filter(({ validFrom }) => validFrom! <= day!)
      .sort((a, b) => (a.validFrom! < b.validFrom! ? -1 : 1));
    if (values.length > 0) return Number(values.at(-1)!.value);
  }
  return NaN;
}
