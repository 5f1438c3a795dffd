import type { ScheduledSquad } from '../../features/jobs/jobs.types.ts';
import { UsageError } from '../support/usage-error.ts';

/** The squad meant by a name or id, and by the club's where that is not enough. @throws {UsageError} */
export function findSquad(
  squads: readonly ScheduledSquad[],
  clubNames: ReadonlyMap<string, string>,
  wanted: { squad: string; club: string | undefined },
): ScheduledSquad {
  const clubOf = (squad: ScheduledSquad) => clubNames.get(squad.clubId) ?? squad.clubId;
  const inClub = squads.filter(
    (squad) => wanted.club === undefined || [squad.clubId, clubOf(squad)].includes(wanted.club),
  );
  if (wanted.club !== undefined && ![...clubNames].flat().includes(wanted.club)) {
    throw new UsageError(`no club "${wanted.club}"; there are: ${listed([...clubNames.values()])}`);
  }
  const named = (squad: ScheduledSquad) => `${squad.name} (club ${clubOf(squad)}, id ${squad.squadId})`;
  const found = inClub.filter(({ squadId, name }) => [squadId, name].includes(wanted.squad));
  if (found.length === 0) throw new UsageError(`no squad "${wanted.squad}"; there are: ${listed(inClub.map(named))}`);
  if (found.length > 1) {
    throw new UsageError(
      `"${wanted.squad}" is more than one squad; add --club or use the id: ${listed(found.map(named))}`,
    );
  }
  return found[0]!;
}

function listed(names: readonly string[]): string {
  if (names.length === 0) return 'none yet';
  return `${names.slice(0, 20).join(', ')}${names.length > 20 ? ` and ${names.length - 20} more` : ''}`;
}
