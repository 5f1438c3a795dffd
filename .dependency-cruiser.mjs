// One direction, plain rooms. Each rule is an allow-list: what is not named is refused.
// A composition root (a module file, a main file, a command) may import anything. domain.ts is no main.ts.
const roots = '(\\.module\\.ts$|[/.]main\\.ts$|^src/http-app\\.ts$|^jobs/worker\\.ts$|^src/commands/)';
const rooms = '^(src/(core|platform|features|persistence|delivery|demo)|jobs|reports|prisma)/';
const own = '^(src|jobs|reports|prisma|test)/';

/** From one room, only these paths of the project, these packages and these built-ins of Node. */
function room(name, from, ownPaths, packages, builtIns = []) {
  const rules = [
    {
      name: `${name}-own`,
      severity: 'error',
      from: { path: from, pathNot: roots },
      to: { path: own, pathNot: ownPaths.length ? ownPaths : ['^$'] },
    },
    {
      name: `${name}-packages`,
      severity: 'error',
      from: { path: from, pathNot: roots },
      to: { path: 'node_modules', pathNot: packages.length ? packages.map((p) => `node_modules/${p}/`) : ['^$'] },
    },
  ];
  if (builtIns !== 'any') {
    rules.push({
      name: `${name}-built-ins`,
      severity: 'error',
      from: { path: from, pathNot: roots },
      to: { dependencyTypes: ['core'], ...(builtIns.length ? { pathNot: `^(node:)?(${builtIns.join('|')})$` } : {}) },
    });
  }
  return rules;
}

const nest = ['@nestjs/common'];
export default {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    { name: 'resolvable', severity: 'error', from: {}, to: { couldNotResolve: true } },
    { name: 'in-a-room', severity: 'error', from: { path: own, pathNot: [rooms, roots, '^test/'] }, to: {} },
    ...room('core', '^src/core/', ['^src/core/'], []),
    ...room(
      'platform',
      '^src/platform/',
      ['^src/platform/'],
      [
        '@nestjs/.*',
        'zod',
        'pino',
        'pino-http',
        'nestjs-pino',
        'nodemailer',
        'temporal-polyfill',
        'rxjs',
        '@types/(node|nodemailer)',
      ],
      'any',
    ),
    ...room(
      'features',
      '^src/features/',
      ['^src/core/', '^src/platform/', '^src/features/'],
      [...nest, 'zod', 'temporal-polyfill', 'csv-parse'],
      ['crypto'],
    ),
    {
      name: 'features-own-folder',
      severity: 'error',
      from: { path: '^src/features/([^/]+)/', pathNot: roots },
      to: { path: '^src/features/', pathNot: ['^src/features/$1/', '\\.types\\.ts$', '\\.service\\.ts$'] },
    },
    ...room(
      'persistence',
      '^src/persistence/',
      [
        '^src/persistence/',
        '^src/features/.*\\.(repository|types|schema)\\.ts$',
        '^src/core/.*types\\.ts$',
        '^src/platform/',
      ],
      [...nest, '@prisma/.*', 'pg', 'pg-boss', '@types/pg', 'zod', 'temporal-polyfill'],
      'any',
    ),
    ...room(
      'reports',
      '^reports/',
      ['^reports/', '^src/features/.*\\.(service|types)\\.ts$', '^src/core/.*types\\.ts$', '^src/platform/'],
      [...nest, 'exceljs', 'echarts', '@resvg/.*', '@expo-google-fonts/.*', 'zod', 'temporal-polyfill'],
      'any',
    ),
    {
      name: 'workbook-sees-its-view-only',
      severity: 'error',
      from: { path: '^reports/.*\\.sheet\\.ts$' },
      to: { path: own, pathNot: ['^reports/.*\\.(sheet|view|style)\\.ts$'] },
    },
    ...room(
      'delivery',
      '^src/delivery/',
      ['^src/delivery/', '^src/features/', '^reports/', '^src/platform/', '^src/core/.*types\\.ts$'],
      ['@nestjs/.*', 'zod', 'fastify', '@fastify/.*', 'rxjs', 'nestjs-pino', 'pino', 'pino-http'],
      'any',
    ),
    ...room(
      'jobs',
      '^jobs/',
      ['^jobs/', '^src/features/', '^reports/', '^src/platform/'],
      ['@nestjs/.*', 'zod', 'temporal-polyfill', 'rxjs'],
      'any',
    ),
    ...room(
      'prisma',
      '^prisma/',
      ['^prisma/', '^src/platform/'],
      ['@prisma/.*', 'prisma', 'pg', 'pg-boss', '@types/pg'],
      'any',
    ),
    ...room('scenario', '^src/demo/', ['^src/demo/'], [], 'any'),
  ],
  options: {
    doNotFollow: { path: 'node_modules' },
    exclude: { path: '^src/persistence/generated/(?!client)' },
    tsConfig: { fileName: 'tsconfig.json' },
    tsPreCompilationDeps: true,
    preserveSymlinks: false,
    enhancedResolveOptions: {
      exportsFields: ['exports'],
      conditionNames: ['import', 'node', 'default', 'types'],
      extensions: ['.ts', '.mjs', '.js', '.json'],
    },
  },
};
