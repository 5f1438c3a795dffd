import { addDays, startOf } from './days.ts';
import { between, wholeBetween } from './seeded.ts';
import { loadKey, ownVolume } from './cast.ts';
import { testedOn } from './physiology.ts';
import { linesOf, meanHeartRate, minutesOf, recipes, setsOf } from './recipes.ts';
import { during, events, ownShare, weekShare } from './week-plan.ts';
import type { Gap } from './gaps.ts';
import type { Recipe, Slot } from './recipes.ts';
import type { ScenarioAthlete, ScenarioSession } from './scenario.types.ts';

export interface Place {
  scenario: number;
  firstDay: string;
  zone: string;
}

/** One athlete's session in one slot of a day, as it is told to the service. */
export function train(place: Place, athlete: ScenarioAthlete, dayIndex: number, slot: Slot, order: number, gap?: Gap) {
  const recipe: Recipe = recipes[slot];
  const { scenario } = place;
  const away = athlete.roles.includes('camp') && during(dayIndex, events.camp);
  const day = addDays(place.firstDay, dayIndex);
  const own = recipe.logged === 'own' || away;
  const session: ScenarioSession = {
    externalId: `${athlete.key}-${String(dayIndex).padStart(2, '0')}-${order}-${slot}`,
    athlete: athlete.key,
    group: own ? null : `${day}-${slot}`,
    day,
    startedAt: startOf(day, away && order > 0 ? '16:00' : recipe.time, place.zone),
    ...work(recipe, scenario, athlete, dayIndex, slot),
    modality: recipe.modality,
    setting: recipe.setting,
    kind: recipe.kind,
    title: recipe.title,
    rating: rating(recipe, scenario, athlete, dayIndex, slot),
    ratingBy: 'athlete',
    ratingDelayMin: 5 * wholeBetween(2, 8, scenario, athlete.key, dayIndex, slot, 'delay'),
    ...(own ? {} : { intendedRating: recipe.rating }),
  };
  return own && gap !== undefined ? withGap(session, gap) : session;
}

function work(recipe: Recipe, scenario: number, athlete: ScenarioAthlete, dayIndex: number, slot: Slot) {
  const usual = ownShare(athlete, dayIndex) * ownVolume(scenario, athlete);
  const length = between(-1, 1, scenario, loadKey(athlete), dayIndex, slot, 'length');
  // Runs keep their length from week to week, so that none of them stands out from the month before.
  const scale =
    recipe.modality === 'running' ? usual * (1 + 0.02 * length) : usual * weekShare(dayIndex) * (1 + 0.05 * length);
  if (recipe.measuredBy === 'sets') {
    const sets = setsOf(recipe, between(0.9, 1.3, scenario, athlete.key, 'strongness'));
    return { durationMin: Math.round((recipe.minutes ?? 0) * scale), content: { kind: 'strength' as const, sets } };
  }
  const lines = linesOf(recipe, testedOn(scenario, athlete, dayIndex), scale);
  // Watches are read in whole minutes: up to one minute stays outside the lines.
  const durationMin = Math.ceil(minutesOf(lines));
  const content = { kind: 'intervals' as const, lines };
  if (recipe.measuredBy === 'power') return { durationMin, content };
  const heart = { durationMin, content, meanHeartRateBpm: meanHeartRate(lines) };
  if (recipe.modality !== 'running') return heart;
  // Easy pace follows the body, not the day: distance goes with the minutes.
  return { ...heart, distanceM: Math.round(durationMin * between(180, 205, scenario, athlete.key, 'pace')) };
}

/** The usual rating of the slot, the athlete's own leaning and a day's mood, in half points. */
function rating(recipe: Recipe, scenario: number, athlete: ScenarioAthlete, dayIndex: number, slot: Slot): number {
  const leaning = between(-0.4, 0.4, scenario, athlete.key, 'leaning');
  const mood = between(-0.6, 0.6, scenario, athlete.key, dayIndex, slot, 'mood');
  const drift = athlete.roles.includes('drifting') ? Math.max(0, dayIndex - events.driftFrom) * 0.045 : 0;
  const felt = Math.round(2 * (recipe.rating + leaning + mood + drift)) / 2;
  return Math.min(10, Math.max(1, felt));
}

function withGap(session: ScenarioSession, gap: Gap): ScenarioSession {
  const { rating, ratingBy, ratingDelayMin, content, ...rest } = session;
  if (gap === 'no-lines') return { ...rest, ...defined({ rating, ratingBy, ratingDelayMin }) };
  if (gap === 'no-rating') return { ...rest, ...defined({ content }) };
  return session;
}

function defined<T extends object>(values: T): { [K in keyof T]?: Exclude<T[K], undefined> } {
  const kept = Object.entries(values).filter(([, value]) => value !== undefined);
  return Object.fromEntries(kept) as { [K in keyof T]?: Exclude<T[K], undefined> };
}
