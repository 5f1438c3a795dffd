import type { Day } from './days-of-log.ts';

export interface Figures {
  primaryMeasure: string;
  domainMinutes: number[];
  domainLoad: number;
  domainLoad28: number;
  ratingLoad: number;
  ratio: number;
  monotony: number;
  strain: number;
  long: Component;
  short: Component;
  basisMix: Record<string, number>;
}

export interface Component {
  units: number;
  value: number;
  low: number;
  high: number;
}

/** Every figure of the measures sheet for a log whose last day is a Sunday; NaN where it has to be withheld. */
export function figuresOf(days: Day[]): Figures {
  const week = days.slice(-7);
  const month = days.slice(-28);
  const covered = month.reduce((sum, day) => sum + total(Object.values(day.counted)), 0);
  const applicable = month.reduce((sum, day) => sum + day.applicable, 0);
  const known = month.filter(({ domain }) => domain.known).length;
  const domainSpeaks = month.length === 28 && known >= 24 && covered >= 0.8 * applicable;
  const loads = days.map((day) => (domainSpeaks ? day.domain : day.rating));
  const lastWeek = loads.slice(-7);
  const whole = lastWeek.every((load) => load.known);
  const values = lastWeek.map(({ value }) => value);
  const mean = total(values) / 7;
  const deviation = Math.sqrt(total(values.map((value) => (value - mean) ** 2)) / 7);
  const monotony = whole ? mean / deviation : NaN;
  return {
    primaryMeasure: domainSpeaks ? 'domain-load' : 'rating-load',
    domainMinutes: [0, 1, 2, 3].map((domain) => total(week.map(({ minutes }) => minutes[domain]!))),
    domainLoad: least(week.map(({ domain }) => domain)),
    domainLoad28: least(month.map(({ domain }) => domain)),
    ratingLoad: least(week.map(({ rating }) => rating)),
    ratio: ratioOf(days, loads, domainSpeaks),
    monotony,
    strain: total(values) * monotony,
    long: component(days, loads, 45),
    short: component(days, loads, 15),
    basisMix: sharesOf(month),
  };
}

type Load = { known: boolean; value: number };

function total(values: number[]): number {
  return values.reduce((sum, value) => sum + value, 0);
}

/** Known days and what is known of the others. */
function least(loads: Load[]): number {
  return total(loads.map(({ value }) => (Number.isNaN(value) ? 0 : value)));
}

function meanOf(loads: Load[], floor: number): number {
  const known = loads.filter((load) => load.known);
  return known.length < floor ? NaN : total(known.map(({ value }) => value)) / known.length;
}

function ratioOf(days: Day[], loads: Load[], domainSpeaks: boolean): number {
  if (loads.length < 28) return NaN;
  if (domainSpeaks) {
    const [acute, chronic] = [sharesOf(days.slice(-7)), sharesOf(days.slice(-28))];
    const bases = new Set([...Object.keys(acute), ...Object.keys(chronic)]);
    if ([...bases].some((basis) => Math.abs((acute[basis] ?? 0) - (chronic[basis] ?? 0)) > 25)) return NaN;
  }
  if (stillReturning(days, loads)) return NaN;
  return meanOf(loads.slice(-7), 6) / meanOf(loads.slice(-28), 24);
}

/** After three days or more without availability, until the 28-day mean is at 80 % of the day before them. */
function stillReturning(days: Day[], loads: Load[]): boolean {
  const chronic = (index: number) => (index < 27 ? NaN : meanOf(loads.slice(index - 27, index + 1), 24));
  const lastOut = days.findLastIndex(({ unavailable }) => unavailable);
  if (lastOut < 0) return false;
  const lastIn = days.findLastIndex(({ unavailable }, index) => index < lastOut && !unavailable);
  if (lastOut - lastIn < 3) return false;
  const before = chronic(lastIn);
  const since = days.map((_, index) => index).filter((index) => index > lastOut);
  return !(before > 0) ? since.length <= 28 : since.every((index) => !(chronic(index) >= 0.8 * before));
}

function sharesOf(days: Day[]): Record<string, number> {
  const minutes: Record<string, number> = {};
  for (const { counted } of days) {
    for (const [basis, value] of Object.entries(counted)) minutes[basis] = (minutes[basis] ?? 0) + value;
  }
  const all = total(Object.values(minutes));
  return Object.fromEntries(Object.entries(minutes).map(([basis, value]) => [basis, (100 * value) / all]));
}

/** Decays day by day and takes each day's load in; read on the morning after the last day. */
function component(days: Day[], loads: Load[], tau: number): Component {
  const decay = Math.exp(-1 / tau);
  const first = loads.slice(0, 28).filter((load) => load.known);
  const start = first.length >= 24 ? (meanOf(first, 1) * decay) / (1 - decay) : 0;
  const through = loads.map((load, index) => (load.known ? same(load.value) : guess(days, loads, index)));
  const run = (which: 0 | 1 | 2): number[] => {
    let level = start;
    return through.map((values) => (level = (level + values[which]) * decay));
  };
  const [middle, low, high] = [run(0), run(1), run(2)];
  const usual = quantile(middle.slice(-182), 0.5);
  const share = (levels: number[]) => (loads.length < 56 ? NaN : (100 * levels.at(-1)!) / usual);
  return { units: middle.at(-1)!, value: share(middle), low: share(low), high: share(high) };
}

function same(value: number): [number, number, number] {
  return [value, value, value];
}

/** Usual, rest and hard day for a day that is not known, none below what is known of it. */
function guess(days: Day[], loads: Load[], index: number): [number, number, number] {
  const floor = Number.isNaN(loads[index]!.value) ? 0 : loads[index]!.value;
  const weekday = (at: number) => new Date(days[at]!.date).getUTCDay();
  const earlier = loads.map((load, at) => ({ ...load, at })).filter((load) => load.known && load.at < index);
  const recent = earlier.filter(({ at }) => at >= index - 56);
  const alike = recent.filter(({ at }) => weekday(at) === weekday(index));
  const from = alike.length >= 3 ? recent : earlier;
  if (from.length === 0) return same(floor);
  const valuesOf = (some: Load[]) => some.map(({ value }) => value);
  const usual = Math.max(floor, quantile(valuesOf(alike.length >= 3 ? alike : earlier), 0.5));
  return [usual, floor, Math.max(floor, usual, quantile(valuesOf(from), 0.9))];
}

/** Linear between the order statistics. */
function quantile(values: number[], share: number): number {
  const sorted = [...values].sort((a, b) => a - b);
  const place = share * (sorted.length - 1);
  const below = Math.floor(place);
  const above = sorted[Math.min(below + 1, sorted.length - 1)]!;
  return sorted[below]! + (place - below) * (above - sorted[below]!);
}
