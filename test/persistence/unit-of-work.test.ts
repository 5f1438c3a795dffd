import { randomUUID } from 'node:crypto';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from '@jest/globals';
import { currentScope, currentTransaction, PrismaUnitOfWork } from '../../src/persistence/prisma-unit-of-work.ts';
import { PrismaService } from '../../src/persistence/prisma.service.ts';
import { ConflictError } from '../../src/platform/errors.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';

const now = new Date('2026-03-02T12:00:00Z');
let database: TestDatabase;
let prisma: PrismaService;
let unit: PrismaUnitOfWork;
let club: string;
let other: string;

beforeAll(async () => {
  database = await createTestDatabase();
  // One connection: what a transaction leaves behind, the next one would find.
  prisma = new PrismaService({ url: database.appUrl, maxConnections: 1 });
  await prisma.onModuleInit();
  unit = new PrismaUnitOfWork(prisma);
});

afterAll(async () => {
  await prisma.onApplicationShutdown();
  await prisma.close();
  await database.drop();
});

beforeEach(async () => {
  [club, other] = [randomUUID(), randomUUID()];
  await unit.runAsOperator(async () => {
    for (const id of [club, other]) {
      await currentTransaction().club.create({ data: { id, name: 'Club', createdAt: now } });
    }
  });
});

const scope = (clubId: string, personId: string | null = null) => ({ clubId, personId });

async function addPerson(email: string, clubId = club): Promise<void> {
  await currentTransaction().person.create({ data: { clubId, id: randomUUID(), name: 'P', email, createdAt: now } });
}

async function emails(clubId = club): Promise<string[]> {
  return unit.run(scope(clubId), async () => {
    const rows = await currentTransaction().person.findMany({ orderBy: { email: 'asc' } });
    return rows.map(({ email }) => email);
  });
}

async function transactionId(): Promise<string> {
  const rows = await currentTransaction().$queryRaw<{ id: string }[]>`select pg_current_xact_id()::text as id`;
  return rows[0]?.id ?? '';
}

describe('run', () => {
  test('commits what ends well, and takes back what fails', async () => {
    expect(await unit.run(scope(club), () => addPerson('a@example.org').then(() => 7))).toBe(7);
    const failing = unit.run(scope(club), async () => {
      await addPerson('b@example.org');
      throw new ConflictError('no');
    });
    await expect(failing).rejects.toThrow(new ConflictError('no'));
    expect(await emails()).toEqual(['a@example.org']);
  });

  test('sees and writes one club only', async () => {
    await unit.run(scope(club), () => addPerson('a@example.org'));
    expect(await emails(other)).toEqual([]);
    await expect(unit.run(scope(other), () => addPerson('b@example.org', club))).rejects.toMatchObject({ status: 403 });
    expect(await emails()).toEqual(['a@example.org']);
  });

  test('tells the database for whom it works, and leaves nothing of that on the connection', async () => {
    const person = randomUUID();
    const read = () => currentTransaction().$queryRaw`
      select current_setting('loadweir.club_id', true) as club, current_setting('loadweir.operator', true) as operator`;
    expect(await unit.run(scope(club, person), read)).toEqual([{ club, operator: '' }]);
    expect(await unit.run(scope(club, person), async () => currentScope())).toEqual({ clubId: club, personId: person });
    expect(await prisma.client.person.count()).toBe(0);
    expect(await prisma.client.club.count()).toBe(0);
  });

  test('a broken constraint comes out as an error of the application, also one checked at the end', async () => {
    await unit.run(scope(club), () => addPerson('a@example.org'));
    await expect(unit.run(scope(club), () => addPerson('a@example.org'))).rejects.toMatchObject({ status: 409 });
    const squad = randomUUID();
    const policies = unit.run(scope(club), async () => {
      const tx = currentTransaction();
      await tx.squad.create({ data: { clubId: club, id: squad, name: 'S', zone: 'UTC', createdAt: now } });
      await tx.$executeRaw`set constraints all deferred`;
      for (const id of [randomUUID(), randomUUID()]) {
        await tx.$executeRaw`insert into load_policy (club_id, id, squad_id, valid_from, settings, created_at)
          values (${club}::uuid, ${id}::uuid, ${squad}::uuid, '2026-01-01', '{}', ${now})`;
      }
      return 'all statements passed';
    });
    await expect(policies).rejects.toMatchObject({ status: 409, fields: [{ field: 'validFrom' }] });
  });

  test('nested for the same club it joins: one transaction, one end', async () => {
    const person = randomUUID();
    const ids = await unit.run(scope(club, person), async () => [
      await transactionId(),
      await unit.run(scope(club, person), transactionId),
      await unit.run(scope(club), transactionId),
    ]);
    expect(new Set(ids).size).toBe(1);
    const failing = unit.run(scope(club), async () => {
      await unit.run(scope(club), () => addPerson('a@example.org'));
      throw new Error('later');
    });
    await expect(failing).rejects.toThrow('later');
    expect(await emails()).toEqual([]);
  });

  test('of nobody yet, it joins for a person, as long as that work lasts', async () => {
    const person = randomUUID();
    const seen = await unit.run(scope(club), async () => [
      currentScope().personId,
      await unit.run(scope(club, person), async () => currentScope().personId),
      currentScope().personId,
      new Set([await transactionId(), await unit.run(scope(club, person), transactionId)]).size,
    ]);
    expect(seen).toEqual([null, person, null, 1]);
  });

  test('never reaches into a second club, changes its person or becomes the operator', async () => {
    const inside = (work: () => Promise<unknown>) => unit.run(scope(club, randomUUID()), work);
    await expect(inside(() => unit.run(scope(other), emails))).rejects.toThrow('second club');
    await expect(inside(() => unit.run(scope(club, randomUUID()), async () => 1))).rejects.toThrow('change the person');
    await expect(inside(() => unit.runAsOperator(async () => 1))).rejects.toThrow('cannot become the operator');
  });

  test('units of work side by side do not see each other', async () => {
    const two = new PrismaService({ url: database.appUrl, maxConnections: 2 });
    const parallel = new PrismaUnitOfWork(two);
    const seen = await Promise.all(
      [club, other, club, other].map((id) =>
        parallel.run(scope(id), async () => {
          await addPerson(`${randomUUID()}@example.org`, id);
          return currentScope().clubId;
        }),
      ),
    );
    await two.close();
    expect(seen).toEqual([club, other, club, other]);
    expect([(await emails()).length, (await emails(other)).length]).toEqual([2, 2]);
  });
});

describe('a repository', () => {
  test('throws outside a unit of work', () => {
    expect(() => currentTransaction()).toThrow('outside a unit of work');
    expect(() => currentScope()).toThrow('outside a unit of work');
  });

  test('throws when something goes on after the unit of work has ended', async () => {
    let late: Promise<unknown> = Promise.resolve();
    await unit.run(scope(club), async () => {
      late = new Promise((resolve) => setTimeout(resolve, 50)).then(() => currentTransaction());
      late.catch(() => undefined);
    });
    await expect(late).rejects.toThrow('something was not awaited');
  });
});

describe('runAsOperator', () => {
  test('sees clubs and nothing inside them', async () => {
    await unit.run(scope(club), () => addPerson('a@example.org'));
    const seen = await unit.runAsOperator(async () => ({
      clubs: await currentTransaction().club.count({ where: { id: { in: [club, other] } } }),
      people: await currentTransaction().person.count(),
    }));
    expect(seen).toEqual({ clubs: 2, people: 0 });
    await expect(unit.runAsOperator(async () => currentScope())).rejects.toThrow('in no club');
  });

  test('makes a club and its first person in one transaction, and looks into it no longer than that', async () => {
    const id = randomUUID();
    const create = (fail: boolean) =>
      unit.runAsOperator(async () => {
        await currentTransaction().club.create({ data: { id, name: 'New', createdAt: now } });
        await unit.run(scope(id), () => addPerson('first@example.org', id));
        expect(await currentTransaction().person.count()).toBe(0);
        if (fail) throw new Error('later');
      });
    await expect(create(true)).rejects.toThrow('later');
    expect(await emails(id)).toEqual([]);
    await create(false);
    expect(await emails(id)).toEqual(['first@example.org']);
  });

  test('leaves the club also when the work in it fails and the operator goes on', async () => {
    const counted = await unit.runAsOperator(async () => {
      await unit.run(scope(club), () => addPerson('a@example.org'));
      const failing = unit.run(scope(club), async () => Promise.reject(new Error('refused before any statement')));
      await expect(failing).rejects.toThrow('refused');
      return unit.runAsOperator(() => currentTransaction().person.count());
    });
    expect(counted).toBe(0);
  });
});
