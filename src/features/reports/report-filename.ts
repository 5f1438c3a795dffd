/** @example reportFilename('Women’s eight', '2026-W48', 1); // => 'loadweir-women-s-eight-2026-W48-v1.xlsx' */
export function reportFilename(squadName: string, isoWeek: string, version: number): string {
  return `loadweir-${slug(squadName)}-${isoWeek}-v${version}.xlsx`;
}

/** A name in letters, digits and hyphens, without accents; at most 60 characters. */
function slug(name: string): string {
  const plain = name.normalize('NFKD').replaceAll(/\p{M}/gu, '').toLowerCase();
  const words = plain.replaceAll(/[^a-z0-9]+/g, '-').slice(0, 60);
  return words.replaceAll(/^-+|-+$/g, '') || 'squad';
}
