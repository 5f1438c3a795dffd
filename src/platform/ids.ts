import { randomBytes } from 'node:crypto';

const COUNTER_BITS = 26;
let lastInstant = NaN;
let counter = 0;

/**
 * A UUID version 7 (RFC 9562, method 1 of section 6.2): time first, then a counter, so that rows made one after another
 * sort in that order, also within a millisecond or under a clock that stands still. The instant is a parameter.
 */
export function newId(now: Date): string {
  const bytes = randomBytes(16);
  const instant = now.getTime();
  // A new millisecond starts anywhere in the lower half, so that there is room to count on.
  counter = instant === lastInstant ? (counter + 1) % 2 ** COUNTER_BITS : bytes.readUInt32BE(12) >>> 7;
  lastInstant = instant;
  bytes.writeUIntBE(instant, 0, 6);
  bytes.writeUInt16BE(0x7000 | (counter >>> 14), 6);
  bytes.writeUInt16BE(0x8000 | (counter & 0x3fff), 8);
  const hex = bytes.toString('hex');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
