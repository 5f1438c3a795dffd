// Chance that depends on its keys alone: the same scenario, athlete and day give the same draw in any order of calls.

type Key = string | number;

/** A draw in [0, 1) that belongs to these keys. */
export function draw(...keys: Key[]): number {
  return scramble(hash(keys.join('|'))) / 4_294_967_296;
}

/** A draw in [low, high). */
export function between(low: number, high: number, ...keys: Key[]): number {
  return low + (high - low) * draw(...keys);
}

/** A whole number from low to high, both included. */
export function wholeBetween(low: number, high: number, ...keys: Key[]): number {
  return low + Math.floor((high - low + 1) * draw(...keys));
}

export function pick<T>(items: readonly T[], ...keys: Key[]): T {
  return items[wholeBetween(0, items.length - 1, ...keys)]!;
}

/** The items in an order that belongs to these keys. */
export function shuffled<T>(items: readonly T[], ...keys: Key[]): T[] {
  return items
    .map((item, index) => ({ item, order: draw(...keys, index) }))
    .sort((a, b) => a.order - b.order)
    .map(({ item }) => item);
}

/** FNV-1a, 32 bits. */
function hash(text: string): number {
  let value = 0x811c9dc5;
  for (const byte of Buffer.from(text)) value = Math.imul(value ^ byte, 0x01000193);
  return value >>> 0;
}

/** Mixes the bits, so that keys that differ in one letter give unrelated draws. */
function scramble(seed: number): number {
  let value = seed ^ (seed >>> 16);
  value = Math.imul(value, 0x7feb352d);
  value ^= value >>> 15;
  value = Math.imul(value, 0x846ca68b);
  return (value ^ (value >>> 16)) >>> 0;
}
