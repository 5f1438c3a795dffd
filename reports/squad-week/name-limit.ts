/** How many athletes a sentence or a mail may name: three for every twenty athletes begun. */
export function nameLimit(athletes: number): number {
  return 3 * Math.max(1, Math.ceil(athletes / 20));
}
