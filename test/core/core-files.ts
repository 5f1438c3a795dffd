import { readdirSync, readFileSync } from 'node:fs';

const root = new URL('../../src/core/', import.meta.url);

/** One documented export of the core. */
export interface DocBlock {
  readonly file: string;
  readonly name: string;
  readonly text: string;
}

/** All files of the core, relative to it. */
export function coreFiles(): string[] {
  return readdirSync(root, { recursive: true, encoding: 'utf8' })
    .filter((name) => name.endsWith('.ts'))
    .sort();
}

export function coreSource(file: string): string {
  return readFileSync(new URL(file, root), 'utf8');
}

/** Everything a file of the core exports. */
export async function coreExports(file: string): Promise<Record<string, unknown>> {
  return (await import(new URL(file, root).href)) as Record<string, unknown>;
}

/** The doc blocks that stand before an exported function. */
export function docBlocks(file: string): DocBlock[] {
  const found = coreSource(file).matchAll(/\/\*\*((?:(?!\*\/)[\s\S])*)\*\/\s*export function (\w+)/g);
  return [...found].map((match) => ({
    file,
    name: match[2]!,
    text: match[1]!.replace(/^ *\* ?/gm, '').trim(),
  }));
}

/** Folders that hold methods; helpers among their files are named here, with why they are none. */
export const HELPERS: Readonly<Record<string, string>> = {
  'series/day.ts': 'calendar arithmetic',
  'ratio/windows.ts': 'checks of options',
  'response/check-gains.ts': 'checks of parameters',
  'flags/types.ts': 'types',
  'flags/constituent.ts': 'the fold the measures share',
  'flags/load-concern-settings.ts': 'checks of settings',
  'flags/overreaching-settings.ts': 'checks of settings',
  'flags/overreaching-step.ts': 'one day of the overreaching screen',
  'flags/overreaching-types.ts': 'types',
  'flags/standing-families.ts': 'part of the overreaching screen',
  'response-signs/check-days.ts': 'checks of days',
  'response-signs/session-work.ts': 'types and columns',
  'response-signs/sign-run.ts': 'the fold the families share',
  'response-signs/types.ts': 'types',
  'numeric/cholesky.ts': 'linear algebra',
  'numeric/gauss-legendre.ts': 'points of integration',
  'numeric/median-in-place.ts': 'the median, in place',
  'numeric/normal.ts': 'the normal distribution',
  'numeric/solve-linear.ts': 'linear algebra',
  'numeric/weighted-least-squares.ts': 'linear algebra',
};

/** Functions that are part of another method and stand in no table. */
export const PARTS: readonly string[] = [
  'checkBounds',
  'ratioConcern',
  'chronicLowConcern',
  'monotonyStrainConcern',
  'spikeConcern',
];

export function methodFiles(): string[] {
  return coreFiles().filter((file) => file.includes('/') && !file.startsWith('catalogue/') && !(file in HELPERS));
}
