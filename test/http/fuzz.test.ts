import { afterAll, beforeAll, expect, it } from '@jest/globals';
import fc from 'fast-check';
import { startTestApp } from '../support/app.ts';
import type { TestApp } from '../support/app.ts';
import { fitting, odd, spoiled } from '../support/from-schema.ts';
import type { JsonSchema } from '../support/from-schema.ts';
import { loggedClub } from '../support/logged-club.ts';
import type { LoggedClub } from '../support/logged-club.ts';
import { fingerprint } from '../support/rows.ts';

// Requests made from the API's own description. Each is refused for one reason at least: nobody asks, somebody asks who
// may not, it is about nothing that is there, its body is spoiled, or a rule forbids it. So nothing may be stored, and
// nothing may break.
const REQUESTS = 2000;
const SEED = 20_260_302;

interface Route {
  method: string;
  path: string;
  body: JsonSchema | null;
  isSheet: boolean;
  query: string[];
}

/** What makes a fitting body one that a rule refuses, by the end of the route. */
const forbidden: Readonly<Record<string, object>> = {
  '/athletes/{athleteId}/sessions': { startedAt: '2101-02-03T04:05:06Z' },
  '/thresholds': {
    values: [{ quantity: 'vo2max', modality: 'rowing', value: 5, method: 'x', validFrom: '2101-01-01' }],
  },
  '/availability': { from: '1990-01-01', to: '1990-01-02' },
  '/periods': { purpose: 'overload', from: '2026-03-01', to: '2026-12-31' },
  '/memberships': { from: '2026-02-01', to: '2026-02-02' },
  '/closing': {},
  '/thresholds/{valueId}/correction': { value: 100_000 },
  '/mornings': { day: '2199-01-01' },
  '/circumstances': { to: '1950-01-01', from: '1950-01-01', athleteId: '0198f3a0-ffff-7000-8000-00000000ffff' },
  '/test-definitions': { name: '2 km' },
  '/test-results': { day: '2199-01-01' },
  '/test-results/{resultId}/correction': { lactateMmolL: 2 },
  '/memberships/{membershipId}/end': { to: '1990-01-01' },
  '/availability/{availabilityId}/end': { to: '1990-01-01' },
};

interface Fuzzed {
  route: Route;
  url: string;
  token: string | undefined;
  body: unknown;
  headers: Record<string, string>;
}

let test: TestApp;
let club: LoggedClub;
let powerless: string;
let routes: Route[];

beforeAll(async () => {
  test = await startTestApp();
  club = await loggedClub(test);
  const other = await test.newClub();
  powerless = (await other.person([])).token;
  routes = readRoutes((await test.api('GET', '/docs/json')).body as Description);
});
afterAll(async () => test?.close());

interface Description {
  paths: Record<string, Record<string, Operation>>;
}
interface Operation {
  parameters?: { name: string; in: string }[];
  requestBody?: { content: Record<string, { schema: JsonSchema }> };
}

function readRoutes({ paths }: Description): Route[] {
  return Object.entries(paths).flatMap(([path, operations]) =>
    Object.entries(operations).map(([method, { parameters = [], requestBody }]) => ({
      method: method.toUpperCase(),
      path,
      body: requestBody?.content['application/json']?.schema ?? null,
      isSheet: requestBody?.content['text/csv'] !== undefined,
      query: parameters.filter((each) => each.in === 'query').map(({ name }) => name),
    })),
  );
}

/** Ids that are there, or that nobody has; days never such that one could be closed. */
function url(route: Route, known: boolean): fc.Arbitrary<string> {
  const names = [...route.path.matchAll(/\{(\w+)\}/g)].map(([, name]) => name!);
  const filled = fc
    .tuple(...names.map((name) => part(name, known)))
    .map((parts) =>
      names.reduce((path, name, at) => path.replace(`{${name}}`, encodeURIComponent(parts[at]!)), route.path),
    );
  const queryName = fc.constantFrom(...route.query, 'no such parameter');
  const value = fc.oneof(
    fc.string({ maxLength: 20 }),
    fc.constantFrom('2026-01-01', '2026-02-30', '-1', 'rowing', 'true'),
  );
  const queries = fc.array(fc.tuple(queryName, value), { maxLength: 3 });
  return fc.tuple(filled, queries).map(([path, pairs]) => {
    const query = new URLSearchParams(
      pairs.map(([name, text]): [string, string] => [name, text.toWellFormed()]),
    ).toString();
    return query === '' ? path : `${path}?${query}`;
  });
}

function part(name: string, known: boolean): fc.Arbitrary<string> {
  if (name === 'day') return fc.constantFrom('2026-02-30', '2199-01-01', '2025-12-31', 'today', '..', '%00');
  const there = club[name as keyof LoggedClub];
  if (known) return there === undefined ? fc.uuid() : fc.constant(there);
  return fc.oneof(fc.uuid(), fc.constantFrom('0', "' or 1=1", '\u0000', '..', 'null', 'é'.repeat(200)));
}

function headers(): fc.Arbitrary<Record<string, string>> {
  const visible = fc.string({ maxLength: 30 }).map((text) => text.replace(/[^\x20-\x7e]/g, '').trim());
  return fc.record(
    {
      'if-match': fc.oneof(visible, fc.constantFrom('"v1"', '"v99999999999"', '*')),
      'idempotency-key': visible.filter((text) => text !== ''),
      'x-request-id': visible,
    },
    { requiredKeys: [] },
  );
}

function fuzzed(): fc.Arbitrary<Fuzzed> {
  return fc.constantFrom(...routes).chain((route) => {
    const fit = route.isSheet
      ? fc.string({ maxLength: 200 })
      : route.body === null
        ? fc.constant(undefined)
        : fitting(route.body);
    const bad = route.isSheet
      ? fc.string({ unit: 'binary', maxLength: 200 })
      : route.body === null
        ? fc.constant(undefined)
        : fc.oneof(
            { weight: 3, arbitrary: spoiled(route.body) },
            odd.filter((value) => !isNothing(value)),
          );
    const make = (known: boolean, token: fc.Arbitrary<string | undefined>, body: fc.Arbitrary<unknown>) =>
      fc.record({ route: fc.constant(route), url: url(route, known), token, body, headers: headers() });
    const garbage = fc
      .oneof(fc.string({ maxLength: 80 }), fc.constant(undefined))
      .map((text) => text?.replace(/[^\x21-\x7e]/g, 'x'));
    const hasTarget = route.path.includes('{');
    const rule =
      route.body === null ? undefined : Object.entries(forbidden).find(([end]) => route.path.endsWith(end))?.[1];
    const against = fit.map((body) => ({ ...(body as object), ...rule }));
    return fc.oneof(
      ...(rule === undefined ? [] : [{ weight: 4, arbitrary: make(true, fc.constant(club.token), against) }]),
      { weight: 1, arbitrary: make(true, garbage, fit) },
      { weight: 1, arbitrary: make(true, fc.constant(powerless), fit) },
      { weight: 1, arbitrary: make(true, fc.constant(club.coach), fit) },
      { weight: 4, arbitrary: make(true, fc.constant(club.token), bad) },
      ...(hasTarget ? [{ weight: 3, arbitrary: make(false, fc.constant(club.token), fit) }] : []),
    );
  });
}

/** An empty body is what some routes take. */
function isNothing(value: unknown): boolean {
  return value === null || (typeof value === 'object' && !Array.isArray(value) && Object.keys(value).length === 0);
}

async function send({ route, url: path, token, body, headers: given }: Fuzzed) {
  const type = route.isSheet ? 'text/csv' : 'application/json';
  const text = body === undefined || typeof body === 'string' ? body : JSON.stringify(body);
  const raw = route.isSheet || typeof body !== 'string' ? text : JSON.stringify(body);
  const withType = raw === undefined ? given : { ...given, 'content-type': type };
  return test.api(route.method, path, { token, headers: withType, ...(raw === undefined ? {} : { body: raw }) });
}

const inside =
  /node_modules|\.[tj]s:\d+|\bat \w+ \(|prisma|pg_catalog|violates|syntax error|select |insert into|undefined/i;

it(`${REQUESTS} requests that all have to be refused break nothing and store nothing`, async () => {
  const before = await fingerprint(test.db.ownerUrl);
  const requests = fc.sample(fuzzed(), { numRuns: REQUESTS, seed: SEED });
  const seen = new Map<number, number>();
  const faults: object[] = [];
  const queue = requests.values();
  const worker = async () => {
    for (const request of queue) {
      const answer = await send(request);
      seen.set(answer.status, (seen.get(answer.status) ?? 0) + 1);
      const told = typeof answer.body === 'string' ? answer.body : JSON.stringify(answer.body);
      const echoed = `${JSON.stringify(request.body) ?? ''}${request.url}`;
      const leaks = answer.status >= 400 && inside.test(told) && !inside.test(decodeURIComponent(echoed));
      const stores =
        answer.status < 400 && request.route.method !== 'GET' && !request.route.path.endsWith('/reopening');
      if (answer.status >= 500 || leaks || stores) {
        faults.push({
          method: request.route.method,
          url: request.url,
          body: request.body,
          headers: request.headers,
          status: answer.status,
          told: told.slice(0, 500),
        });
      }
    }
  };
  await Promise.all([worker(), worker(), worker(), worker()]);
  expect(faults).toEqual([]);
  // The requests reach every line of defence, not just the first.
  for (const status of [400, 401, 403, 404, 422]) expect(seen.get(status) ?? 0).toBeGreaterThan(10);
  expect([...seen.values()].reduce((sum, count) => sum + count, 0)).toBe(REQUESTS);
  expect(await fingerprint(test.db.ownerUrl)).toEqual(before);
}, 180_000);
