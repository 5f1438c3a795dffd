import { command, temporaryFolder } from '../../commands/support/command.ts';

export interface DemoOutput {
  folder: string;
  stdout: string;
  stderr: string;
  seconds: number;
  remove(): void;
}

/** One run of the built command with --exit, its files in a folder of its own. */
export async function runDemo(...args: string[]): Promise<DemoOutput> {
  const folder = temporaryFolder();
  const started = Date.now();
  const { code, stdout, stderr } = await command('src/commands/demo.js', ['--exit', '--out', folder.path, ...args], {})
    .finished;
  if (code !== 0) throw new Error(`the demo ended with ${code}:\n${stderr}\n${stdout}`);
  return { folder: folder.path, stdout, stderr, seconds: (Date.now() - started) / 1000, remove: () => folder.remove() };
}
