import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, expect, test } from '@jest/globals';
import { command, descendants, isAlive, temporaryFolder } from '../commands/support/command.ts';

const cleanUp: (() => Promise<void> | void)[] = [];
afterEach(async () => {
  for (const step of cleanUp.splice(0).reverse()) await step();
});

test('Ctrl-C in the middle of the logging leaves neither process nor folder behind', async () => {
  const folder = temporaryFolder();
  cleanUp.push(() => folder.remove());
  const out = join(folder.path, 'out');
  const demo = command('src/commands/demo.js', ['--exit', '--out', out], { TMPDIR: folder.path });
  cleanUp.push(async () => {
    for (const pid of [demo.pid, ...descendants(demo.pid)]) if (isAlive(pid)) process.kill(pid, 'SIGKILL');
    await demo.finished;
  });
  await demo.says(/sessions logged/, 60_000);
  const processes = descendants(demo.pid);
  expect(processes.length).toBeGreaterThanOrEqual(2);
  demo.signal('SIGINT');
  const { code, stderr } = await demo.finished;
  expect(code).toBe(130);
  expect(stderr).toContain('Stopped before it was finished.');
  expect(processes.filter(isAlive)).toEqual([]);
  expect(readdirSync(folder.path)).toEqual([]);
  expect(existsSync(out)).toBe(false);
}, 120_000);

test('help is told and a bad argument is named, and nothing is started', async () => {
  const help = await command('src/commands/demo.js', ['--help'], {}).finished;
  expect(help).toMatchObject({ code: 0, stderr: '' });
  expect(help.stdout).toContain('--scenario N');
  const wrong = await command('src/commands/demo.js', ['--today', 'tomorrow'], {}).finished;
  expect(wrong).toMatchObject({ code: 2, stdout: '' });
  expect(wrong.stderr).toBe('--today tomorrow: allowed is a date like 2026-11-30, from 1990-01-01 to 2100-12-31\n');
});
