import pg from 'pg';

/** Rows as the owner sees them, past row-level security; dates and instants as text. */
export async function rowsOf<Row extends object = Record<string, unknown>>(
  ownerUrl: string,
  statement: string,
  values: unknown[] = [],
): Promise<Row[]> {
  const client = new pg.Client({ connectionString: ownerUrl });
  await client.connect();
  try {
    return (await client.query<Row>(statement, values)).rows;
  } finally {
    await client.end();
  }
}

const counted = `
  select table_name from information_schema.columns
  where table_schema = 'public' and column_name = 'club_id' order by table_name`;

/** How many rows each table of clubs has. */
export async function rowCounts(ownerUrl: string, except: readonly string[] = []): Promise<Record<string, number>> {
  const tables = (await rowsOf<{ table_name: string }>(ownerUrl, counted)).map(({ table_name: name }) => name);
  const each = ['club', ...tables]
    .filter((name) => !except.includes(name))
    .map((name) => `select '${name}' as name, count(*)::int as count from ${name}`);
  const rows = await rowsOf<{ name: string; count: number }>(ownerUrl, each.join(' union all '));
  return Object.fromEntries(rows.map(({ name, count }) => [name, count]));
}
