import { execFile } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, posix, resolve } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';

// The import rules are fed every import between rooms, in a tree of the same layout, and have to catch exactly those
// the map of the house forbids. A rule that forbids nothing looks like one that passes.
const root = resolve(import.meta.dirname, '../..');

/** What can be imported: a file of each room, and packages. */
const targets = {
  core: 'src/core/load/some-load.ts',
  'core types': 'src/core/load/load.types.ts',
  platform: 'src/platform/clock.ts',
  'own service': '',
  'feature service': 'src/features/other/other.service.ts',
  'feature types': 'src/features/other/other.types.ts',
  'feature repository': 'src/features/other/other.repository.ts',
  'feature schema': 'src/features/other/other.schema.ts',
  'feature helper': 'src/features/other/count-things.ts',
  persistence: 'src/persistence/prisma-other.repository.ts',
  delivery: 'src/delivery/http/other.controller.ts',
  reports: 'reports/other/other.view.ts',
  jobs: 'jobs/other.job.ts',
  prisma: 'prisma/prepare.ts',
  scenario: 'src/demo/cast.ts',
  test: 'test/support/app.ts',
  'services module': 'src/services.module.ts',
  '@nestjs/common': '@nestjs/common',
  '@nestjs/core': '@nestjs/core',
  zod: 'zod',
  pg: 'pg',
  'pg-boss': 'pg-boss',
  '@prisma/client': '@prisma/client',
  exceljs: 'exceljs',
  echarts: 'echarts',
  fastify: 'fastify',
  pino: 'pino',
  nodemailer: 'nodemailer',
  'csv-parse': 'csv-parse',
  'temporal-polyfill': 'temporal-polyfill',
  'node:crypto': 'node:crypto',
  'node:fs': 'node:fs',
} as const;
type Target = keyof typeof targets;

const features: Target[] = [
  'feature service',
  'feature types',
  'feature repository',
  'feature schema',
  'feature helper',
];
const builtIns: Target[] = ['node:crypto', 'node:fs'];

/** The map: a room's folder and all it may import. Its own room is always among it. */
const rooms: Record<string, { folder: string; may: Target[] }> = {
  core: { folder: 'src/core/load', may: ['core', 'core types'] },
  platform: {
    folder: 'src/platform',
    may: ['platform', '@nestjs/common', '@nestjs/core', 'zod', 'pino', 'nodemailer', 'temporal-polyfill', ...builtIns],
  },
  feature: {
    folder: 'src/features/planted',
    may: [
      ...(['core', 'core types', 'platform', 'own service', 'feature service', 'feature types'] as const),
      ...(['@nestjs/common', 'zod', 'csv-parse', 'temporal-polyfill', 'node:crypto'] as const),
    ],
  },
  persistence: {
    folder: 'src/persistence',
    may: [
      ...(['core types', 'platform', 'feature types', 'feature repository', 'feature schema', 'persistence'] as const),
      ...(['@nestjs/common', 'zod', 'pg', 'pg-boss', '@prisma/client', 'temporal-polyfill', ...builtIns] as const),
    ],
  },
  reports: {
    folder: 'reports/planted',
    may: [
      ...(['core types', 'platform', 'own service', 'feature service', 'feature types', 'reports'] as const),
      ...(['@nestjs/common', 'zod', 'exceljs', 'echarts', 'temporal-polyfill', ...builtIns] as const),
    ],
  },
  delivery: {
    folder: 'src/delivery/http',
    may: [
      ...(['core types', 'platform', ...features, 'own service', 'delivery', 'reports'] as const),
      ...(['@nestjs/common', '@nestjs/core', 'zod', 'fastify', 'pino', ...builtIns] as const),
    ],
  },
  jobs: {
    folder: 'jobs',
    may: [
      ...(['platform', ...features, 'own service', 'reports', 'jobs'] as const),
      ...(['@nestjs/common', '@nestjs/core', 'zod', 'temporal-polyfill', ...builtIns] as const),
    ],
  },
  prisma: { folder: 'prisma', may: ['platform', 'prisma', 'pg', 'pg-boss', '@prisma/client', ...builtIns] },
  scenario: { folder: 'src/demo', may: ['scenario', ...builtIns] },
  command: { folder: 'src/commands', may: Object.keys(targets) as Target[] },
};

const ownService = 'src/features/planted/planted.service.ts';
const pathOf = (target: Target) => (target === 'own service' ? ownService : targets[target]);
const isOwn = (path: string) => path.endsWith('.ts');

interface Violation {
  from: string;
  to: string;
  rule: { name: string };
}

let tree: string;
let found: Violation[];

function put(path: string, text: string): void {
  mkdirSync(join(tree, dirname(path)), { recursive: true });
  writeFileSync(join(tree, path), text);
}

function importing(from: string, to: string): string {
  if (!isOwn(to)) return `import type * as planted from '${to}';\nexport type Planted = typeof planted;\n`;
  const relative = posix.relative(posix.dirname(from), to);
  return `import type { thing } from '${relative.startsWith('.') ? relative : `./${relative}`}';\nexport type Planted = typeof thing;\n`;
}

const plantedFile = (room: string, target: Target) =>
  `${rooms[room]!.folder}/planted-${room}-${target.replace(/\W+/g, '-')}.ts`;

async function cruise(folder: string, config: string, places: string[]): Promise<Violation[]> {
  const bin = join(root, 'node_modules/dependency-cruiser/bin/dependency-cruiser.mjs');
  const output = await new Promise<string>((done, fail) => {
    const args = [bin, '--config', config, '--output-type', 'json', ...places];
    execFile(process.execPath, args, { cwd: folder, maxBuffer: 64 * 1024 * 1024 }, (error, stdout, stderr) =>
      stdout === '' ? fail(new Error(stderr || error?.message)) : done(stdout),
    );
  });
  return (JSON.parse(output) as { summary: { violations: Violation[] } }).summary.violations;
}

beforeAll(async () => {
  tree = mkdtempSync(join(tmpdir(), 'loadweir-rules-'));
  for (const name of ['.dependency-cruiser.mjs', 'tsconfig.json', 'package.json']) {
    cpSync(join(root, name), join(tree, name));
  }
  symlinkSync(join(root, 'node_modules'), join(tree, 'node_modules'));
  put(
    'linked.mjs',
    "import rules from './.dependency-cruiser.mjs';\n" +
      'export default { ...rules, options: { ...rules.options, preserveSymlinks: true } };\n',
  );
  for (const path of [...Object.values(targets), ownService]) {
    if (isOwn(path)) put(path, 'export const thing = 1;\n');
  }
  for (const room of Object.keys(rooms)) {
    for (const target of Object.keys(targets) as Target[]) {
      const file = plantedFile(room, target);
      put(file, importing(file, pathOf(target)));
    }
  }
  put(
    'src/features/planted/planted.module.ts',
    importing('src/features/planted/planted.module.ts', targets.persistence),
  );
  put('src/core/domain.ts', importing('src/core/domain.ts', targets.platform));
  put('src/elsewhere/planted.ts', importing('src/elsewhere/planted.ts', targets.core));
  put('reports/planted/week.sheet.ts', importing('reports/planted/week.sheet.ts', targets['feature types']));
  put('src/core/one.ts', "import { two } from './two.ts';\nexport const one = () => two;\n");
  put('src/core/two.ts', "import { one } from './one.ts';\nexport const two = () => one;\n");
  put('src/core/lost.ts', "import { gone } from './gone.ts';\nexport const lost = gone;\n");
  found = await cruise(tree, 'linked.mjs', ['src', 'jobs', 'reports', 'prisma']);
});
afterAll(() => rmSync(tree, { recursive: true, force: true }));

const rulesBroken = (from: string) => found.filter((violation) => violation.from === from).map(({ rule }) => rule.name);

describe.each(Object.keys(rooms))('from the room %s', (room) => {
  const { may } = rooms[room]!;
  const all = Object.keys(targets) as Target[];
  const refused = all.filter((target) => !may.includes(target));

  test.each(may)('%s may be imported', (target) => {
    expect(rulesBroken(plantedFile(room, target))).toEqual([]);
  });
  if (refused.length > 0) {
    test.each(refused)('%s is caught', (target) => {
      expect(rulesBroken(plantedFile(room, target))).not.toEqual([]);
    });
  }
});

describe('besides', () => {
  test('a module file may import what its neighbours may not', () => {
    expect(rulesBroken('src/features/planted/planted.module.ts')).toEqual([]);
  });
  test('a name that ends like a main file opens no door', () => {
    expect(rulesBroken('src/core/domain.ts')).toEqual(['core-own']);
  });
  test('a file outside every room is caught', () => {
    expect(rulesBroken('src/elsewhere/planted.ts')).toEqual(['in-a-room']);
  });
  test('a workbook file sees its view only', () => {
    expect(rulesBroken('reports/planted/week.sheet.ts')).toEqual(['workbook-sees-its-view-only']);
  });
  test('a cycle and a file that is not there are caught', () => {
    expect(rulesBroken('src/core/one.ts')).toEqual(['no-cycles']);
    expect(rulesBroken('src/core/lost.ts')).toEqual(['resolvable']);
  });
});
