// Everything "npm test" runs after the build: format, lint, import rules and types beside the tests, which leave the
// processors idle while they wait for other processes. The tests take far longer, so theirs is the last line; should a
// check end later, its output comes first and the last line is printed again.
import { spawn } from 'node:child_process';

const checks = ['format:check', 'lint', 'imports', 'types'];

function run(name) {
  const child = spawn('npm', ['run', '-s', name], { stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => (output += chunk));
  return new Promise((resolve) => child.on('close', (code) => resolve({ code, output: output.trim() })));
}

async function runChecks() {
  let failed = 0;
  for (const name of checks) {
    const { code, output } = await run(name);
    failed += code === 0 ? 0 : 1;
    process.stdout.write(`${name}: ${code === 0 ? 'fine' : `failed\n${output}`}\n`);
  }
  return failed;
}

function runTests() {
  const jest = spawn('npm', ['run', '-s', 'jest', '--', ...process.argv.slice(2)], {
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  let lastLine = '';
  for (const stream of [jest.stdout, jest.stderr]) {
    stream.on('data', (chunk) => {
      process.stdout.write(chunk);
      lastLine = `${lastLine}${chunk}`.trimEnd().split('\n').at(-1);
    });
  }
  return new Promise((resolve) => jest.on('close', (code) => resolve({ code, lastLine })));
}

/** A failed check counts as one that failed. */
function counting(line, failedChecks) {
  return line.replace(/(\d+) failed$/, (_, failed) => `${Number(failed) + failedChecks} failed`);
}

let checking = true;
const checked = runChecks().finally(() => (checking = false));
const { code, lastLine } = await runTests();
const late = checking;
const failed = await checked;
if (failed > 0) process.stdout.write('A check failed: see above.\n');
if (late || failed > 0) process.stdout.write(`${counting(lastLine, failed)}\n`);
process.exitCode = failed > 0 || code !== 0 ? 1 : 0;
