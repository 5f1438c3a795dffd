import { between, pick, shuffled, wholeBetween } from './seeded.ts';
import type { CastRole, ScenarioAthlete, StaffMember } from './scenario.types.ts';

// Trees, weather and stones: nobody is called like this.
const trees = [
  'Aspen', 'Hornbeam', 'Medlar', 'Tamarack', 'Osier', 'Larch', 'Whitebeam', 'Quince', 'Sycamore', 'Hemlock', 'Spruce',
  'Hickory', 'Buckthorn', 'Cypress', 'Mulberry', 'Sequoia', 'Catalpa', 'Elm', 'Wingnut', 'Acacia', 'Sumac', 'Cork-Oak',
  'Banyan', 'Bay-Willow', 'Cedar', 'Maple',
]; // prettier-ignore
const weatherAndStones = [
  'Drizzle', 'Gneiss', 'Haar', 'Basalt', 'Sleet', 'Chert', 'Mistral', 'Dolomite', 'Hailstone', 'Schist', 'Graupel',
  'Pumice', 'Overcast', 'Feldspar', 'Rime', 'Travertine', 'Thundershower', 'Obsidian', 'Cirrus', 'Tuff', 'Katabat',
  'Greywacke', 'Downdraft', 'Marl', 'Groundfrost', 'Porphyry',
]; // prettier-ignore
const clubs = ['Marlwater', 'Sleetmere', 'Basalt Reach', 'Hailbrook', 'Chertlake', 'Rimefjord', 'Pumice Bay'];

/** Who carries which role, by place in the squad; the other places are uneventful. */
const castByPlace: readonly (readonly CastRole[])[] = [
  ['drifting'],
  ['twin'],
  ['ill'],
  ['overload-now', 'camp'],
  ['rib'],
  ['stale-thresholds', 'camp'],
  ['gaps'],
  ['overload-over'],
  ['late-threshold'],
  ['load-spike'],
];
export const squadSize = 16;

const unseen: readonly CastRole[] = ['twin', 'late-threshold'];

export interface Cast {
  club: string;
  squad: string;
  staff: StaffMember[];
  athletes: ScenarioAthlete[];
}

/** Names and roles of one scenario. */
export function castOf(scenario: number, firstDay: string): Cast {
  const first = shuffled(trees, scenario, 'trees');
  const last = shuffled(weatherAndStones, scenario, 'stones');
  const club = `${pick(clubs, scenario, 'club')} Rowing Club`;
  const host = `${club.split(' ').slice(0, -2).join('-').toLowerCase()}.example`;
  const person = (place: number) => {
    const name = `${first[place]!} ${last[place]!}`;
    return { name, email: `${name.toLowerCase().replaceAll(' ', '.')}@${host}` };
  };
  const staffKeys: readonly StaffMember['key'][] = ['admin', 'manager', 'coach', 'staff', 'medic'];
  const athletes = Array.from({ length: squadSize }, (_, place) => {
    const roles = [...(castByPlace[place] ?? [])];
    return {
      key: athleteKey(place),
      ...person(place),
      sex: place === squadSize - 1 ? null : place % 2 === 0 ? ('female' as const) : ('male' as const),
      birthYear: Number(firstDay.slice(0, 4)) - wholeBetween(19, 31, scenario, place, 'age'),
      roles,
      uneventful: roles.every((role) => unseen.includes(role)),
      memberFrom: firstDay,
    };
  });
  const staff = staffKeys.map((key, index) => ({ key, ...person(squadSize + index) }));
  return { club, squad: 'Senior rowers', staff, athletes };
}

export function athleteKey(place: number): string {
  return `athlete-${String(place + 1).padStart(2, '0')}`;
}

/** The twin does the drifting athlete's training to the second: both draw their load under one key. */
export function loadKey(athlete: ScenarioAthlete): string {
  return athlete.roles.includes('twin') ? athleteKey(0) : athlete.key;
}

/** How much this athlete trains, compared with the plan. */
export function ownVolume(scenario: number, athlete: ScenarioAthlete): number {
  return between(0.93, 1.07, scenario, loadKey(athlete), 'volume');
}

/** Half of the squad runs, the other half rides instead. */
export function runs(athlete: ScenarioAthlete): boolean {
  return Number(loadKey(athlete).slice(-2)) % 2 === 1;
}
