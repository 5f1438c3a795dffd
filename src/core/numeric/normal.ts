/** Density of the standard normal distribution. */
export function normalDensity(x: number): number {
  return Math.exp(-0.5 * x * x) / Math.sqrt(2 * Math.PI);
}

/** Beyond this the distribution is 0 or 1 to the last digit of a double. */
const FAR = 9;

/**
 * Distribution function of the standard normal distribution, by the series of Marsaglia G 2004, J Stat Softw 11(4):
 * Φ(x) = ½ + φ(x)·(x + x³÷3 + x⁵÷(3·5) + …).
 */
export function normalDistribution(x: number): number {
  if (Math.abs(x) > FAR) return x > 0 ? 1 : 0;
  let sum = x;
  let term = x;
  for (let n = 3; sum + term !== sum || n === 3; n += 2) {
    term *= (x * x) / n;
    sum += term;
    if (term === 0) break;
  }
  return 0.5 + sum * normalDensity(x);
}
