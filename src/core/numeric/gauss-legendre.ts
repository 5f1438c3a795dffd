/** Points and weights of Gauss–Legendre integration from `from` to `to`, by Newton's method on the polynomial. */
export function gaussLegendre(count: number, from: number, to: number): { x: number; weight: number }[] {
  const half = (to - from) / 2;
  const middle = (to + from) / 2;
  return Array.from({ length: count }, (_, index) => {
    let z = Math.cos((Math.PI * (index + 0.75)) / (count + 0.5));
    let slope = 1;
    for (let step = 0; step < 50; step += 1) {
      let [value, before] = [1, 0];
      for (let degree = 1; degree <= count; degree += 1) {
        [value, before] = [((2 * degree - 1) * z * value - (degree - 1) * before) / degree, value];
      }
      slope = (count * (z * value - before)) / (z * z - 1);
      const change = value / slope;
      z -= change;
      if (Math.abs(change) < 1e-15) break;
    }
    return { x: middle + half * z, weight: (2 * half) / ((1 - z * z) * slope * slope) };
  });
}
