import { mkdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { dirname } from 'node:path';

type Rings = Record<string, Record<string, string>>;

/** The demo's access keys in a file only its owner may read: a key is shown once, and the demo can be run again. */
export class KeyRing {
  readonly #file: string;
  readonly #club: string;

  /** @param club the external key of the club the keys belong to */
  constructor(file: string, club: string) {
    this.#file = file;
    this.#club = club;
  }

  get(person: string): string | undefined {
    return this.#read()[this.#club]?.[person];
  }

  /** Appears whole: a run cut short leaves the file as it was. */
  keep(person: string, secret: string): void {
    const rings = this.#read();
    rings[this.#club] = { ...rings[this.#club], [person]: secret };
    mkdirSync(dirname(this.#file), { recursive: true, mode: 0o700 });
    const unfinished = `${this.#file}.${process.pid}`;
    writeFileSync(unfinished, `${JSON.stringify(rings, null, 2)}\n`, { mode: 0o600 });
    renameSync(unfinished, this.#file);
  }

  get file(): string {
    return this.#file;
  }

  #read(): Rings {
    try {
      return JSON.parse(readFileSync(this.#file, 'utf8')) as Rings;
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code === 'ENOENT') return {};
      throw new Error(`The keys of the demo in ${this.#file} cannot be read.`, { cause: error });
    }
  }
}
