import { describe, expect, it } from '@jest/globals';
import { existsSync, readFileSync } from 'node:fs';
import { readEnv } from '../../src/platform/env.ts';

// The container files name paths, scripts, ports and variables of this project by hand; nothing else would notice when
// one of them moves. No container is built here.
const read = (file: string) => readFileSync(new URL(`../../${file}`, import.meta.url), 'utf8');
const exists = (file: string) => existsSync(new URL(`../../${file}`, import.meta.url));
const all = (text: string, pattern: RegExp) => [...text.matchAll(pattern)].map((match) => match[1]!);

const dockerfile = read('docker/Dockerfile');
const compose = read('docker/compose.yml');
const ignore = read('.dockerignore').split('\n');
const scripts = Object.keys((JSON.parse(read('package.json')) as { scripts: object }).scripts);
const variables = new Set(all(read('src/platform/env.ts'), /^ {2}([A-Z][A-Z_]+):/gm));

const copied = dockerfile
  .split('\n')
  .filter((line) => line.startsWith('COPY ') && !line.includes('--from='))
  .flatMap((line) => line.split(/\s+/).slice(1, -1));

describe('the container files', () => {
  it('copy what exists and what the ignore file lets through', () => {
    expect(copied.length).toBeGreaterThan(6);
    for (const path of copied) {
      expect([path, exists(path)]).toEqual([path, true]);
      expect(ignore).toContain(`!${path.split('/')[0]}`);
    }
  });

  it('copy every folder the build compiles, and the migrations', () => {
    const { include } = JSON.parse(read('.config/tsconfig.build.json')) as { include: string[] };
    for (const folder of include) expect(copied).toContain(folder.replace('../', ''));
    expect(copied).toContain('prisma/migrations');
  });

  it('run scripts that exist', () => {
    const used = all(dockerfile, /npm run (?:-s )?([\w:-]+)/g);
    expect(used).toContain('build');
    for (const script of used) expect(scripts).toContain(script);
  });

  it('start files of the build that have a source', () => {
    const entries = [...all(dockerfile, /(dist\/[\w/.-]+\.js)/g), ...all(compose, /(dist\/[\w/.-]+\.js)/g)];
    expect(new Set(entries)).toEqual(
      new Set(['dist/src/main.js', 'dist/jobs/main.js', 'dist/src/commands/migrate.js']),
    );
    for (const entry of entries) {
      const source = entry.replace(/^dist\//, '').replace(/\.js$/, '.ts');
      expect([source, exists(source)]).toEqual([source, true]);
    }
  });

  it('name only variables the environment knows', () => {
    const inImage = all(dockerfile, /\b([A-Z][A-Z_]+)=/g).filter((name) => !['NODE_ENV', 'TZ'].includes(name));
    const services = compose.slice(compose.indexOf('x-environment:')).replace(/\n {2}db:[\s\S]*?\n\n/, '\n');
    const inCompose = all(services, /^ +([A-Z][A-Z_]+):/gm);
    expect(inImage).toContain('PORT');
    expect(inCompose).toContain('DATABASE_APP_URL');
    for (const name of [...inImage, ...inCompose]) expect(variables).toContain(name);
  });

  it('agree with the default port and listen where a container can be reached', () => {
    const { PORT } = readEnv({});
    expect(dockerfile).toContain(`PORT=${PORT}`);
    expect(dockerfile).toContain(`EXPOSE ${PORT}`);
    expect(dockerfile).toContain('HOST=0.0.0.0');
    expect(compose).toContain(`127.0.0.1:${PORT}:${PORT}`);
  });

  it('run as a user without power, keep the owner’s connection from the services and migrate first', () => {
    expect(dockerfile.lastIndexOf('USER node')).toBeGreaterThan(dockerfile.lastIndexOf('FROM '));
    expect(all(compose, /^ +(DATABASE_URL):/gm)).toHaveLength(1);
    expect(compose.match(/condition: service_completed_successfully/g)).toHaveLength(2);
    expect(dockerfile).toContain('/health/ready');
  });
});
