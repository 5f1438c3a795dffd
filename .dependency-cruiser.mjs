// One direction, plain rooms. Each rule is an allow-list: what is not named is refused.
// A composition root (a module file, a main file, a command) may import anything.
const roots = '(\\.module\\.ts$|main\\.ts$|http-app\\.ts$|^src/commands/)';
const own = '^(src|jobs|reports|prisma|test)/';

/** From one room, only these paths of the project and these packages. */
function room(name, from, ownPaths, packages, builtIns) {
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
  if (!builtIns) {
    rules.push({
      name: `${name}-built-ins`,
      severity: 'error',
      from: { path: from, pathNot: roots },
      to: { dependencyTypes: ['core'] },
    });
  }
  return rules;
}

const nest = ['@nestjs/common'];
export default {
  forbidden: [
    { name: 'no-cycles', severity: 'error', from: {}, to: { circular: true } },
    { name: 'resolvable', severity: 'error', from: {}, to: { couldNotResolve: true } },
    ...room('core', '^src/core/', ['^src/core/'], [], false),
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
        'fastify',
        '@types/.*',
      ],
      true,
    ),
    ...room(
      'features',
      '^src/features/',
      ['^src/core/', '^src/platform/', '^src/features/'],
      [...nest, 'zod', 'temporal-polyfill', 'csv-parse'],
      true,
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
      [...nest, '@prisma/.*', 'pg', 'pg-boss', '@types/.*', 'zod', 'temporal-polyfill'],
      true,
    ),
    ...room(
      'reports',
      '^reports/',
      ['^reports/', '^src/features/.*\\.(service|types)\\.ts$', '^src/core/.*types\\.ts$', '^src/platform/'],
      [...nest, 'exceljs', 'echarts', '@resvg/.*', '@expo-google-fonts/.*', 'zod', 'temporal-polyfill'],
      true,
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
      ['@nestjs/.*', 'zod', 'fastify', '@fastify/.*', 'rxjs', 'nestjs-pino', 'pino', 'pino-http', '@types/.*'],
      true,
    ),
    ...room(
      'jobs',
      '^jobs/',
      ['^jobs/', '^src/features/', '^reports/', '^src/platform/'],
      ['@nestjs/.*', 'zod', 'temporal-polyfill', 'rxjs'],
      true,
    ),
    ...room(
      'prisma',
      '^prisma/',
      ['^prisma/', '^src/platform/'],
      ['@prisma/.*', 'prisma', 'pg', 'pg-boss', '@types/.*'],
      true,
    ),
    ...room('scenario', '^src/demo/', ['^src/demo/'], [], true),
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
