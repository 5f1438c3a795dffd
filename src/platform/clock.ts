/** The service's only source of "now" (port and DI token). Time inside the numbers is a parameter. */
export abstract class Clock {
  abstract now(): Date;
}

/** The machine's clock, moved by a fixed number of milliseconds (0 in production). */
export class SystemClock extends Clock {
  readonly #offsetMs: number;

  constructor(offsetMs = 0) {
    super();
    this.#offsetMs = offsetMs;
  }

  now(): Date {
    return new Date(Date.now() + this.#offsetMs);
  }
}

/** A clock that stands still until it is told otherwise: for tests and for replaying a day. */
export class FixedClock extends Clock {
  #instant: number;

  constructor(instant: Date | string) {
    super();
    this.#instant = toInstant(instant);
  }

  now(): Date {
    return new Date(this.#instant);
  }

  set(instant: Date | string): void {
    this.#instant = toInstant(instant);
  }

  /** Moves the clock; a negative number moves it back. */
  advance(milliseconds: number): void {
    this.#instant += milliseconds;
  }
}

function toInstant(instant: Date | string): number {
  const milliseconds = new Date(instant).getTime();
  if (Number.isNaN(milliseconds)) throw new RangeError(`not an instant: ${String(instant)}`);
  return milliseconds;
}
