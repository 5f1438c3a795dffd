import { Body, Controller, Get, Module, Post } from '@nestjs/common';
import { Test } from '@nestjs/testing';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { AppModule } from '../../src/app.module.ts';
import { Access, Public } from '../../src/delivery/http/access.decorator.ts';
import { createAdapter } from '../../src/delivery/http/server.ts';
import { readEnv } from '../../src/platform/env.ts';
import { fixedClock } from '../support/clock.ts';
import { createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';

@Controller('v1/forgotten')
class RuleLessController {
  @Get()
  list() {
    return [];
  }
}

@Controller('v1/unchecked')
class SchemaLessController {
  @Post()
  @Access('squads.write', { kind: 'club' })
  add(@Body() body: unknown) {
    return body;
  }
}

@Controller('v1/aimless')
class AimlessController {
  @Get(':id')
  @Access('squads.read', { kind: 'squad', param: 'squadId' })
  one() {
    return {};
  }
}

@Controller('v1/fine')
class FineController {
  @Get()
  @Public()
  list() {
    return [];
  }
}

let db: TestDatabase;
beforeAll(async () => {
  db = await createTestDatabase();
});
afterAll(async () => db.drop());

async function start(url: string, ...controllers: (new () => object)[]): Promise<void> {
  class Extra {}
  Module({ controllers })(Extra);
  const env = readEnv({ DATABASE_APP_URL: url, LOADWEIR_MODE: 'test', LOG_LEVEL: 'silent' });
  const clock = fixedClock();
  const built = await Test.createTestingModule({ imports: [AppModule.for(env, clock), Extra] }).compile();
  const app = built.createNestApplication(createAdapter(clock), { bodyParser: false, logger: false });
  try {
    await app.init();
  } finally {
    await app.close();
  }
}

describe('the whole tree of modules', () => {
  test('is built and starts', async () => {
    await start(db.appUrl, FineController);
  });

  test.each([
    [RuleLessController, 'RuleLessController.list: neither @Access nor @Public'],
    [SchemaLessController, 'SchemaLessController.add: @Body without a zod schema'],
    [AimlessController, 'AimlessController.one: no parameter squadId in /v1/aimless/:id'],
  ])('does not start with %p', async (controller, fault) => {
    await expect(start(db.appUrl, controller)).rejects.toThrow(fault);
  });

  test('does not start as a role that row-level security does not bind', async () => {
    await expect(start(db.ownerUrl)).rejects.toThrow(/row-level security|owner/);
  });
});
