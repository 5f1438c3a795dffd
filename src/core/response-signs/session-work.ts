import type { DomainMinutes } from '../types.ts';

/** What a session asks for. */
export interface SessionWork {
  readonly modality: string;
  /** Length; NaN: not known. */
  readonly totalMin: number;
  /** 0 where domains do not apply (strength, games), NaN where they do and are not known. */
  readonly minutes: DomainMinutes;
}

/** A session and how hard it felt. A competition is rated differently and is to be left out of both. */
export interface RatedSession extends SessionWork {
  readonly day: number;
  /** Name of the rating as a measured value. */
  readonly id: string;
  /** CR-10; NaN: not rated. */
  readonly rating: number;
  /** May enter the relation: not in heat, altitude, illness or return, not suspect or disputed. */
  readonly inBaseline: boolean;
  /** May be judged. */
  readonly judged: boolean;
}

/** From this rating on the scale says "at least this". */
export const CEILING = 9;

/** True where rating, length and minutes are all known. */
export function isRated({ rating, totalMin, minutes }: RatedSession): boolean {
  const { moderate, heavy, severe, extreme } = minutes;
  return [rating, totalMin, moderate, heavy, severe, extreme].every(Number.isFinite);
}

/** The explanatory values: constant, hours in total, heavy, severe with extreme, and a mark per modality but the first. */
export function columnsOf({ modality, totalMin, minutes }: SessionWork, modalities: readonly string[]): number[] {
  const { heavy, severe, extreme } = minutes;
  const marks = modalities.slice(1).map((one) => Number(one === modality));
  return [1, totalMin / 60, heavy / 60, (severe + extreme) / 60, ...marks];
}
