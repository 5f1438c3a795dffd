import type { ImpulseGains } from '../types.ts';
import { above, within } from '../guard.ts';

/** Throws unless the gains are 0 or more and tau1 > tau2 > 0. */
export function checkGains(fn: string, gains: ImpulseGains): void {
  within(fn, 'k1', gains.k1, 0, Infinity);
  within(fn, 'k2', gains.k2, 0, Infinity);
  checkTimeConstants(fn, gains);
}

/** Throws unless tau1 > tau2 > 0. */
export function checkTimeConstants(fn: string, { tau1, tau2 }: { tau1: number; tau2: number }): void {
  above(fn, 'tau2', tau2, 0, Infinity, 'days');
  above(fn, 'tau1', tau1, tau2, Infinity, 'days (above tau2)');
}
