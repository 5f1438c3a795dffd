import type { LoadConcernDay, Muting } from '../../src/core/types.ts';

/** A Monday. */
export const FIRST = 20_780;

/** Quiet days from FIRST on; `change` overrides what a day is about. */
export function quietDays(
  count: number,
  change: (index: number) => Partial<Omit<LoadConcernDay, 'day'>> = () => ({}),
): LoadConcernDay[] {
  return Array.from({ length: count }, (_, index) => ({
    ratio: 1,
    chronic: 100,
    monotony: 1.2,
    strain: 800,
    muted: null,
    spike: null,
    ...change(index),
    day: FIRST + index,
  }));
}

/** Days with these ratios. */
export function ratioDays(...ratios: number[]): LoadConcernDay[] {
  return quietDays(ratios.length, (index) => ({ ratio: ratios[index]! }));
}

/** The same days, muted from one index to another, both included. */
export function mute(days: readonly LoadConcernDay[], from: number, to: number, muted: Muting): LoadConcernDay[] {
  return days.map((one, index) => (index >= from && index <= to ? { ...one, muted } : one));
}

export function repeat(count: number, value: number): number[] {
  return Array<number>(count).fill(value);
}
