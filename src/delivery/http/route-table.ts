import { Injectable } from '@nestjs/common';

/** Which methods a path knows: a known path asked with another method is 405, not 404. */
@Injectable()
export class RouteTable {
  readonly #routes: { method: string; shape: RegExp }[] = [];

  add(methods: string | readonly string[], path: string): void {
    const source = path
      .split('/')
      .map((part) => (part.startsWith(':') ? '[^/]+' : part === '*' ? '.*' : part.replace(/[^\w-]/g, '\\$&')))
      .join('/');
    const shape = new RegExp(`^${source}/?$`);
    for (const method of [methods].flat()) this.#routes.push({ method, shape });
  }

  /** Methods of a path, without repetition; none for an unknown path. */
  methodsOf(path: string): string[] {
    return [...new Set(this.#routes.filter(({ shape }) => shape.test(path)).map(({ method }) => method))].toSorted();
  }
}
