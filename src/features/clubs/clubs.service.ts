import { Injectable } from '@nestjs/common';
import { Clock } from '../../platform/clock.ts';
import { RuleError } from '../../platform/errors.ts';
import { newId } from '../../platform/ids.ts';
import { UnitOfWork } from '../../platform/unit-of-work.ts';
import { TokensService } from '../access/tokens.service.ts';
import { PeopleService } from '../people/people.service.ts';
import { ClubsRepository } from './clubs.repository.ts';
import type { ClubInput, ClubMade } from './clubs.schema.ts';
import type { Club } from './clubs.types.ts';

const firstTokenDays = 90;

@Injectable()
export class ClubsService {
  constructor(
    private readonly clubs: ClubsRepository,
    private readonly people: PeopleService,
    private readonly tokens: TokensService,
    private readonly work: UnitOfWork,
    private readonly clock: Clock,
  ) {}

  /**
   * A club with its first admin and a token to begin with. With a key that made a club before, that club is answered
   * again, without a token. Runs in the operator's unit of work.
   */
  async add(input: ClubInput, externalKey: string | null): Promise<{ made: boolean; answer: ClubMade }> {
    if (externalKey !== null) {
      await this.clubs.holdKey(externalKey);
      const known = await this.clubs.findByKey(externalKey);
      if (known !== null) return { made: false, answer: await this.again(known, input) };
    }
    const now = this.clock.now();
    const club = { id: newId(now), name: input.name, externalKey };
    await this.clubs.insert({ ...club, createdAt: now });
    return this.work.run({ clubId: club.id, personId: null }, async () => {
      const admin = await this.people.add({ ...input.admin, roles: [{ role: 'admin' }] });
      const issued = await this.tokens.issue(club.id, admin.id, { label: 'first token', validDays: firstTokenDays });
      const { id, secret, expiresAt } = issued;
      const token = { id, secret, expiresAt };
      return { made: true, answer: { club: { id: club.id, name: club.name }, admin: { personId: admin.id }, token } };
    });
  }

  private async again(club: Club, input: ClubInput): Promise<ClubMade> {
    return this.work.run({ clubId: club.id, personId: null }, async () => {
      const admin = (await this.people.list()).find(({ email }) => email === input.admin.email);
      if (club.name !== input.name || admin === undefined) {
        throw new RuleError('The key was used for another club.', undefined, { code: 'idempotency-key-reused' });
      }
      return { club: { id: club.id, name: club.name }, admin: { personId: admin.id }, token: null };
    });
  }
}
