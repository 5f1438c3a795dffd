import { expect } from '@jest/globals';
import pg from 'pg';
import { translateDatabaseError } from '../../../src/persistence/constraint-errors.ts';
import { constraintMessages } from '../../../src/persistence/constraint-messages.ts';
import { AppError } from '../../../src/platform/errors.ts';
import { createTestDatabase } from '../../support/database.ts';

/** A database written to as its owner, past the schemas of the edge. */
export interface OwnersDatabase {
  insert: (table: string, row: object) => Promise<void>;
  /** Names of the constraints and unique indexes of the tables, primary keys left out. */
  constraintsOf: (tables: readonly string[]) => Promise<string[]>;
  close: () => Promise<void>;
}

export async function openAsOwner(): Promise<OwnersDatabase> {
  const db = await createTestDatabase();
  const owner = new pg.Client({ connectionString: db.ownerUrl });
  await owner.connect();
  return {
    insert: async (table, row) => {
      const given = Object.entries(row).filter(([, value]) => value !== undefined);
      const [names, places] = [given.map(([name]) => name), given.map((_, index) => `$${index + 1}`)];
      await owner.query(
        `insert into ${table} (${names.join(', ')}) values (${places.join(', ')})`,
        given.map(([, value]) => value as unknown),
      );
    },
    constraintsOf: async (tables) => {
      const { rows } = await owner.query<{ name: string }>(
        `select conname as name from pg_constraint
         where conrelid = any($1::regclass[]) and contype in ('c', 'f', 'u', 'x')
         union select indexrelid::regclass::text from pg_index
         where indrelid = any($1::regclass[]) and indisunique and not indisprimary`,
        [tables],
      );
      return rows.map(({ name }) => name).toSorted();
    },
    close: async () => {
      await owner.end();
      await db.drop();
    },
  };
}

/** The row is refused by this constraint, and the one who sent it is told which field and what is allowed. */
export async function expectRefused(inserting: Promise<void>, constraint: string, status: number): Promise<void> {
  const error: unknown = await inserting.then(
    () => undefined,
    (refusal: unknown) => refusal,
  );
  expect(error).toMatchObject({ constraint });
  const told = translateDatabaseError(error);
  expect(told).toBeInstanceOf(AppError);
  const { field, allowed } = constraintMessages[constraint]!;
  expect(told).toMatchObject({ status, fields: [{ field, allowed }] });
}
