import { fork } from 'node:child_process';
import type { ChildProcess } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import type { ReadyMessage } from '../../platform/serve-until-stopped.ts';

const PATIENCE_MS = 35_000;

/**
 * A service in a process of its own. It is detached, so that Ctrl-C reaches the parent only; it closes by itself when
 * the parent is gone, because then its channel breaks.
 */
export class ServiceProcess {
  readonly name: string;
  readonly #child: ChildProcess;
  readonly #exited: Promise<string>;
  readonly #ready: Promise<ReadyMessage>;
  #stopping = false;

  constructor(name: string, entry: URL, env: NodeJS.ProcessEnv) {
    this.name = name;
    this.#child = fork(fileURLToPath(entry), {
      detached: true,
      env,
      execArgv: ['--enable-source-maps'],
      stdio: ['ignore', 'inherit', 'inherit', 'ipc'],
    });
    this.#exited = new Promise((resolve) => {
      this.#child.once('exit', (code, signal) => resolve(signal ?? `code ${code}`));
      this.#child.once('error', (error) => resolve(error.message));
    });
    this.#ready = new Promise((resolve, reject) => {
      this.#child.once('message', (message) => resolve(message as ReadyMessage));
      void this.#exited.then((how) => reject(new Error(`The ${name} did not start (${how}).`)));
    });
    this.#ready.catch(() => undefined);
  }

  get pid(): number | undefined {
    return this.#child.pid;
  }

  /** @throws if it ends before it is ready */
  async ready(): Promise<ReadyMessage> {
    return this.#ready;
  }

  /** Resolves with how it ended when nobody asked it to. */
  async failed(): Promise<string> {
    const how = await this.#exited;
    return this.#stopping ? new Promise(() => undefined) : `The ${this.name} ended (${how}).`;
  }

  /** Lets it answer what is under way and close; after a while it is ended. */
  async stop(): Promise<void> {
    this.#stopping = true;
    this.#child.kill('SIGTERM');
    const late = setTimeout(() => this.#child.kill('SIGKILL'), PATIENCE_MS);
    await this.#exited;
    clearTimeout(late);
  }

  kill(): void {
    this.#stopping = true;
    this.#child.kill('SIGKILL');
  }
}
