import { chartMethods } from './catalogue/chart-methods.ts';
import { closedFormMethods } from './catalogue/closed-form-methods.ts';
import { domainMethods } from './catalogue/domain-methods.ts';
import { effortMethods } from './catalogue/effort-methods.ts';
import { flagMethods } from './catalogue/flag-methods.ts';
import { heartRateMethods } from './catalogue/heart-rate-methods.ts';
import { loadMethods } from './catalogue/load-methods.ts';
import { measureMethods } from './catalogue/measure-methods.ts';
import type { Method } from './catalogue/method.ts';
import { monitoringMethods } from './catalogue/monitoring-methods.ts';
import { overreachingMethods } from './catalogue/overreaching-methods.ts';
import { ratioMethods } from './catalogue/ratio-methods.ts';
import { responseMethods } from './catalogue/response-methods.ts';
import { responseSignMethods } from './catalogue/response-sign-methods.ts';
import { resultMethods } from './catalogue/result-methods.ts';
import { seriesMethods } from './catalogue/series-methods.ts';
import { statisticsMethods } from './catalogue/statistics-methods.ts';

export type { Method, MethodInput } from './catalogue/method.ts';

/** Every method of the core, by subject. */
export const catalogue: readonly Method[] = [
  ...loadMethods,
  ...heartRateMethods,
  ...domainMethods,
  ...statisticsMethods,
  ...seriesMethods,
  ...ratioMethods,
  ...responseMethods,
  ...closedFormMethods,
  ...monitoringMethods,
  ...resultMethods,
  ...chartMethods,
  ...responseSignMethods,
  ...effortMethods,
  ...overreachingMethods,
  ...flagMethods,
  ...measureMethods,
];

/** The methods as a Markdown table: method, inputs with units, unit, source, checks. */
export function methodsTable(): string {
  const rows = catalogue.map(({ id, name, inputs, unit, source, provenance, checkedAgainst }) => [
    `${name} (\`${id}\`)`,
    inputs.map((input) => `${input.name} [${input.unit}]`).join(', '),
    unit,
    provenance === source ? source : `${source} (${provenance})`,
    checkedAgainst.length === 0 ? 'examples and properties in the tests' : checkedAgainst.join(' '),
  ]);
  const head = ['method', 'inputs', 'unit', 'source', 'checked against'];
  return [head, head.map(() => '---'), ...rows].map((cells) => `| ${cells.join(' | ')} |`).join('\n');
}
