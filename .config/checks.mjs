// Runs the checks that need no database side by side and prints each one's output whole, in this order.
import { spawn } from 'node:child_process';

const checks = ['format:check', 'lint', 'imports', 'types'];

function run(name) {
  const child = spawn('npm', ['run', '-s', name], { stdio: ['ignore', 'pipe', 'pipe'] });
  let output = '';
  for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => (output += chunk));
  return new Promise((resolve) => child.on('close', (code) => resolve({ name, code, output: output.trim() })));
}

let failed = false;
for (const { name, code, output } of await Promise.all(checks.map(run))) {
  failed ||= code !== 0;
  process.stdout.write(
    `${name}: ${code === 0 ? 'fine' : 'failed'}\n${code === 0 || output === '' ? '' : `${output}\n`}`,
  );
}
process.exitCode = failed ? 1 : 0;
