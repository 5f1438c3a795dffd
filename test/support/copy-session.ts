import { rowsOf } from './rows.ts';

/** The same session on the days after, with its weight and day's sums, without asking 599 times. */
export async function copySession(ownerUrl: string, id: string, times: number): Promise<void> {
  const columns = async (table: string) =>
    (
      await rowsOf<{ name: string }>(
        ownerUrl,
        `select column_name as name from information_schema.columns where table_name = $1 and table_schema = 'public'`,
        [table],
      )
    ).map(({ name }) => name);
  const list = (names: string[], instead: Record<string, string>) =>
    names.map((name) => instead[name] ?? `o.${name}`).join();
  const newId = `('0198f3a0-0000-7000-8000-' || lpad(to_hex(n), 12, '0'))::uuid`;
  const session = await columns('training_session');
  await rowsOf(
    ownerUrl,
    `insert into training_session (${session.join()}) select ${list(session, {
      id: newId,
      training_day: 'o.training_day + n',
      started_at: `o.started_at + n * interval '1 day'`,
    })} from training_session o, generate_series(1, $2::int) n where o.id = $1`,
    [id, times],
  );
  const weight = await columns('session_weight');
  await rowsOf(
    ownerUrl,
    `insert into session_weight (${weight.join()}) select ${list(weight, { session_id: newId })}
     from session_weight o, generate_series(1, $2::int) n where o.session_id = $1`,
    [id, times],
  );
  const total = await columns('daily_total');
  await rowsOf(
    ownerUrl,
    `insert into daily_total (${total.join()}) select ${list(total, { day: 'o.day + n' })}
     from daily_total o join training_session s on s.athlete_id = o.athlete_id and s.training_day = o.day,
       generate_series(1, $2::int) n where s.id = $1`,
    [id, times],
  );
}
