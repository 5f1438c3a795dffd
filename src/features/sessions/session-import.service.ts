import { Injectable } from '@nestjs/common';
import type { Principal } from '../access/access.types.ts';
import { AuditService } from '../access/audit.service.ts';
import { RuleError } from '../../platform/errors.ts';
import { SquadsService } from '../squads/squads.service.ts';
import type { NewSession } from './place-sessions.ts';
import { readSheet } from './session-sheet.ts';
import type { RowError, SheetRow } from './session-sheet.ts';
import { SessionStoreService } from './session-store.service.ts';
import { SessionsRepository } from './sessions.repository.ts';
import type { AthleteContext } from './sessions.types.ts';
import { columnOf, sheetSession } from './sheet-session.ts';

/** Brings in a sheet of sessions: every row, or none and everything that is wrong with any row. */
@Injectable()
export class SessionImportService {
  constructor(
    private readonly sessions: SessionsRepository,
    private readonly storage: SessionStoreService,
    private readonly squads: SquadsService,
    private readonly audit: AuditService,
  ) {}

  async import(principal: Principal, squadId: string, text: string, dryRun: boolean) {
    const sheet = readSheet(text);
    const { zone } = await this.squads.squad(squadId);
    const findAthlete = await this.athleteFinder(squadId);
    const errors: RowError[] = [];
    const good: { row: number; session: NewSession }[] = [];
    for (const row of sheet.rows) {
      const athlete = findAthlete(row);
      const zoneOn = (day: string) => ('context' in athlete ? zoneOnDay(athlete.context, day) : null) ?? zone;
      const session = sheetSession(row, sheet.decimalComma, zoneOn);
      if ('error' in athlete) errors.push(athlete.error);
      if ('errors' in session) errors.push(...session.errors);
      if ('entry' in session && 'context' in athlete) {
        good.push({ row: row.row, session: { athleteId: athlete.context.athleteId, entry: session.entry } });
      }
    }
    const stored = await this.storage.store(
      good.map(({ session }) => session),
      {
        enteredBy: principal.personId,
        groupId: null,
        squadId,
        dryRun,
        refuse: (faults) => {
          errors.push(
            ...faults.map(({ index, kind: _, ...fault }): RowError => {
              return { ...fault, row: good[index]!.row, field: columnOf(fault.field) };
            }),
          );
          refuseRows(errors);
        },
      },
    );
    if (!dryRun) await this.audit.record('sessions.import', 'squad', squadId, { rows: sheet.rows.length });
    return { rows: sheet.rows.length, stored: stored.length, errors: [] };
  }

  /** Who a row means: an athlete who ever belonged to the squad, by id or by the exact name if one has it alone. */
  private async athleteFinder(squadId: string) {
    const stays = await this.squads.members(squadId, '0001-01-01', '9999-12-31');
    const byName = Map.groupBy(stays, ({ name }) => name);
    const contexts = await this.sessions.athleteContexts([...new Set(stays.map(({ athleteId }) => athleteId))]);
    return ({ row, cells }: SheetRow): { context: AthleteContext } | { error: RowError } => {
      const given = cells.athlete ?? '';
      const ids = [...new Set(byName.get(given)?.map(({ athleteId }) => athleteId) ?? [given.toLowerCase()])];
      const context = ids.length === 1 ? contexts.get(ids[0]!) : undefined;
      if (context !== undefined) return { context };
      const allowed =
        ids.length > 1 ? 'the id: several athletes have this name' : 'id or exact name of an athlete of the squad';
      return { error: { row, field: 'athlete', value: given.slice(0, 100), allowed } };
    };
  }
}

function refuseRows(errors: readonly RowError[]): void {
  if (errors.length === 0) return;
  const inOrder = errors.toSorted((a, b) => a.row - b.row);
  throw new RuleError('Rows of the sheet are refused; nothing was stored.', inOrder);
}

function zoneOnDay({ memberships, zonePeriods }: AthleteContext, day: string): string | null {
  const covers = ({ from, to }: { from: string; to: string | null }) => from <= day && (to === null || day <= to);
  return (zonePeriods.find(covers) ?? memberships.find(covers))?.zone ?? null;
}
