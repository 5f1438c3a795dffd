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

/** Every table of clubs: how many rows it has and what is in them. Equal twice: nothing was stored in between. */
export async function fingerprint(ownerUrl: string): Promise<Record<string, string>> {
  const tables = (await rowsOf<{ table_name: string }>(ownerUrl, counted)).map(({ table_name: name }) => name);
  const each = ['club', ...tables].map(
    (name) => `select '${name}' as name,
      count(*) || ' rows ' || coalesce(md5(string_agg(t::text, '\n' order by t::text)), '') as print from ${name} t`,
  );
  const rows = await rowsOf<{ name: string; print: string }>(ownerUrl, each.join(' union all '));
  return Object.fromEntries(rows.map(({ name, print }) => [name, print]));
}
