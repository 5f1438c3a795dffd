import { randomUUID } from 'node:crypto';
import type pg from 'pg';

type Row = Record<string, unknown>;

/** Writes the rows one request left behind again, for another athlete, as bare inserts in one transaction. */
export class RowWriter {
  readonly #client: pg.Client;
  readonly #clubId: string;
  readonly #athletes: readonly [string, string];
  #rows: { table: string; row: Row }[] = [];
  #day = 0;

  constructor(client: pg.Client, clubId: string, athletes: readonly [string, string]) {
    this.#client = client;
    this.#clubId = clubId;
    this.#athletes = athletes;
  }

  get tables(): string[] {
    return this.#rows.map(({ table }) => table);
  }

  /** Finds out which rows a request adds. Tables that hold others' keys come after those. */
  async learn(request: () => Promise<unknown>): Promise<void> {
    const { rows } = await this.#client.query<{ table: string }>(
      `select c.table_name as table from information_schema.columns c
       where c.table_schema = 'public' and c.column_name = 'club_id' order by c.table_name <> 'training_session', 1`,
    );
    const before = await this.#all(rows.map(({ table }) => table));
    await request();
    const after = await this.#all(rows.map(({ table }) => table));
    for (const [table, now] of after) {
      const known = before.get(table)!;
      for (const [text, row] of now) if (!known.has(text)) this.#rows.push({ table, row });
    }
    if (!this.tables.includes('training_session')) throw new Error('the request stored no session');
  }

  /** The same rows once more, with keys of their own. */
  async write(): Promise<void> {
    this.#day += 1;
    const day = new Date(Date.UTC(2010, 0, 1) + this.#day * 86_400_000).toISOString().slice(0, 10);
    const ids = new Map<string, string>([[this.#athletes[0], this.#athletes[1]]]);
    await this.#client.query('begin');
    await this.#name();
    for (const { table, row } of this.#rows) {
      const copy: Row = {
        ...row,
        ...('day' in row ? { day } : {}),
        ...('training_day' in row ? { training_day: day } : {}),
      };
      if (typeof row.id === 'string') copy.id = idFor(ids, row.id);
      const text = JSON.stringify(copy, (_, value: unknown) =>
        typeof value === 'string' ? (ids.get(value) ?? value) : value,
      );
      await this.#client.query({
        name: `copy ${table}`,
        text: `insert into ${table} select * from jsonb_populate_record(null::${table}, $1)`,
        values: [text],
      });
    }
    await this.#client.query('commit');
  }

  async #all(tables: readonly string[]): Promise<Map<string, Map<string, Row>>> {
    await this.#client.query('begin');
    await this.#name();
    const found = new Map<string, Map<string, Row>>();
    for (const table of tables) {
      const { rows } = await this.#client.query<{ row: Row }>(`select to_jsonb(t) as row from ${table} t`);
      found.set(table, new Map(rows.map(({ row }) => [JSON.stringify(row), row])));
    }
    await this.#client.query('rollback');
    return found;
  }

  async #name(): Promise<void> {
    await this.#client.query({
      name: 'name the club',
      text: `select set_config('loadweir.club_id', $1, true), set_config('loadweir.operator', '', true)`,
      values: [this.#clubId],
    });
  }
}

function idFor(ids: Map<string, string>, id: string): string {
  const fresh = ids.get(id) ?? randomUUID();
  ids.set(id, fresh);
  return fresh;
}
