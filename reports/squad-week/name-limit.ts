/** How many athletes a sentence or a mail may name: three, and in larger squads three for every full twenty athletes. */
export function nameLimit(athletes: number): number {
  return 3 * Math.max(1, Math.floor(athletes / 20));
}
