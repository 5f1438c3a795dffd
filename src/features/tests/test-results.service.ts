import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { ConflictError, NotFoundError, RuleError, ValidationError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { localDay } from '../../platform/zoned-time.ts';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { AthletesService } from '../athletes/athletes.service.ts';
import { judgeResult, misfits } from './judge-result.ts';
import { presentResult } from './present-test.ts';
import { TestsRepository } from './tests.repository.ts';
import type { ResultCorrection, ResultInput, ResultReadings, ResultView } from './tests.schema.ts';
import type { TestDefinition, TestResult } from './tests.types.ts';

/** Results of criterion tests and standard bouts, each beside what the own earlier ones let expect. */
@Injectable()
export class TestResultsService {
  constructor(
    private readonly tests: TestsRepository,
    private readonly athletes: AthletesService,
    private readonly audit: AuditService,
    private readonly clock: Clock,
  ) {}

  async add(principal: Principal, athleteId: string, input: ResultInput): Promise<ResultView> {
    const { definitionId, day, ...readings } = input;
    const definition = await this.definitionFor(athleteId, definitionId, day);
    const others = await this.tests.results([athleteId]);
    if (others.some((one) => one.definitionId === definitionId && one.day === day)) {
      throw new ConflictError(`There is a result of ${day} already.`, {
        fields: [
          { field: 'day', value: day, allowed: 'a day without a result of this test', hint: 'Correct that one.' },
        ],
      });
    }
    const result = this.result(principal, { athleteId, definition, day, supersedes: null }, readings, others);
    await this.tests.insertResult(result);
    await this.audit.record('tests.result', 'athlete', athleteId, { id: result.id, definitionId, day });
    return presentResult(result, definition, others);
  }

  /** A new result in place of the old one, which stays on record. */
  async correct(
    principal: Principal,
    { athleteId, resultId }: { athleteId: string; resultId: string },
    { reason, ...readings }: ResultCorrection,
  ): Promise<ResultView> {
    const { old, definition, others } = await this.found(athleteId, resultId);
    const { day } = old;
    const result = this.result(principal, { athleteId, definition, day, supersedes: old.id }, readings, others);
    await this.takeOut(old.id, principal, reason, this.clock.now());
    await this.tests.insertResult(result);
    await this.audit.record('tests.correct', 'athlete', athleteId, { id: result.id, supersedes: old.id });
    return presentResult(result, definition, others);
  }

  async withdraw(
    principal: Principal,
    { athleteId, resultId }: { athleteId: string; resultId: string },
    reason: string,
  ): Promise<ResultView> {
    const { old, definition, others } = await this.found(athleteId, resultId);
    const now = this.clock.now();
    await this.takeOut(old.id, principal, reason, now);
    await this.audit.record('tests.withdraw-result', 'athlete', athleteId, { id: old.id });
    return presentResult({ ...old, withdrawnAt: now, withdrawReason: reason }, definition, others);
  }

  /** By day, of one test or of all. */
  async list(athleteId: string, definitionId?: string): Promise<ResultView[]> {
    const { results, definitions } = await this.of([athleteId]);
    const byId = new Map(definitions.map((definition) => [definition.id, definition]));
    return results
      .filter((one) => definitionId === undefined || one.definitionId === definitionId)
      .map((one) => presentResult(one, byId.get(one.definitionId)!, results));
  }

  /** Results of several athletes by day, and the tests they are of, withdrawn ones too: what flags rest on. */
  async of(athleteIds: readonly string[]): Promise<{ results: TestResult[]; definitions: TestDefinition[] }> {
    const results = await this.tests.results(athleteIds);
    const definitions = await this.tests.definitionsById([...new Set(results.map((one) => one.definitionId))]);
    return { results, definitions };
  }

  private result(
    principal: Principal,
    place: { athleteId: string; definition: TestDefinition; day: string; supersedes: string | null },
    { note, value, confirmed, ...given }: ResultReadings,
    others: readonly TestResult[],
  ): TestResult {
    const { athleteId, definition, day, supersedes } = place;
    const faults = misfits(definition, { value, ...given });
    if (faults.length > 0) throw new ValidationError(faults, `This does not fit a ${definition.kind} test.`);
    const earlier = others.filter((one) => one.definitionId === definition.id && one.day < day);
    const { quality, notes } = judgeResult({ value, confirmed }, earlier);
    const now = this.clock.now();
    return {
      ...{ id: newId(now), definitionId: definition.id, athleteId, day, value: value ?? null },
      ...{ workW: given.workW ?? null, workMps: given.workMps ?? null, heartRateBpm: given.heartRateBpm ?? null },
      ...{ heartRateRecoveryBpm: given.heartRateRecoveryBpm ?? null, rating: given.rating ?? null },
      ...{ lactateMmolL: given.lactateMmolL ?? null, quality, qualityNotes: notes, note: note ?? null },
      ...{ enteredBy: principal.personId, enteredAt: now, supersedes },
      ...{ withdrawnAt: null, withdrawnBy: null, withdrawReason: null },
    };
  }

  /** Of two who take one result out or correct it at the same moment, one does. */
  private async takeOut(id: string, principal: Principal, reason: string, at: Date): Promise<void> {
    if (await this.tests.withdrawResult(id, principal.personId, reason, at)) return;
    throw new ConflictError('The result was corrected or withdrawn at the same moment.');
  }

  private async found(athleteId: string, resultId: string) {
    const results = await this.tests.results([athleteId]);
    const old = results.find(({ id }) => id === resultId);
    if (old === undefined) throw new NotFoundError();
    const [definition] = await this.tests.definitionsById([old.definitionId]);
    return { old, definition: definition!, others: results.filter(({ id }) => id !== old.id) };
  }

  /** The test, if the athlete's squad of that day does it and the day has come. */
  private async definitionFor(athleteId: string, definitionId: string, day: string): Promise<TestDefinition> {
    const now = this.clock.now();
    const today = localDay(now, await this.athletes.zoneOn(athleteId, now));
    if (day > today) {
      throw new RuleError('That day has not come yet.', [
        { field: 'day', value: day, allowed: `a date not after ${today}, the athlete's today` },
      ]);
    }
    const squad = await this.athletes.squadOn(athleteId, day);
    if (squad === null) {
      throw new RuleError('The athlete belonged to no squad that day.', [
        { field: 'day', value: day, allowed: 'a date within a membership' },
      ]);
    }
    const definition = (await this.tests.definitions(squad.id)).find(({ id }) => id === definitionId);
    if (definition === undefined) {
      throw new RuleError('The athlete’s squad does no such test.', [
        { field: 'definitionId', value: definitionId, allowed: 'a test of the squad the athlete was in that day' },
      ]);
    }
    return definition;
  }
}
