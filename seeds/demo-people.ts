import type { Role } from '#shared/domain/vocabulary';

/** A person who can sign in to the demo, with the password that `npm start` prints. */
export interface DemoPerson {
  email: string;
  password: string;
  name: string;
  role: Role;
  regions: string[];
  branches: string[];
}

/** One person a role. Names are invented; addresses lie under the reserved top-level domain `.example` (RFC 2606). */
export const DEMO_PEOPLE: readonly DemoPerson[] = [
  {
    email: 'recorder@underseam.example',
    password: 'lance-both-ways',
    name: 'Mirre Oskvell',
    role: 'recorder',
    regions: [],
    branches: ['HAV'],
  },
  {
    email: 'manager@underseam.example',
    password: 'monday-half-past-seven',
    name: 'Ansa Tollgarv',
    role: 'site_manager',
    regions: [],
    branches: ['HAV'],
  },
  {
    email: 'lead@underseam.example',
    password: 'sound-and-river',
    name: 'Jorre Pellmask',
    role: 'regional_lead',
    regions: ['PLAIN', 'SOUND'],
    branches: [],
  },
  {
    email: 'office@underseam.example',
    password: 'all-that-was-sold',
    name: 'Brana Holtsverd',
    role: 'head_office',
    regions: [],
    branches: [],
  },
];

/** The demo's site manager of a branch, if it has one. */
export function managerOf(branch: string): DemoPerson | undefined {
  return DEMO_PEOPLE.find(
    (person) => person.role === 'site_manager' && person.branches.includes(branch),
  );
}

const KEY_ID = 'de3000000417';
const KEY_SECRET = '5ea30417'.repeat(8);

/** The push key of Havnsund's own system in the demo. Everybody knows it, so it exists in demo data only. */
export const DEMO_PUSH_KEY = {
  branch: 'HAV',
  label: 'Workshop system (demo)',
  id: KEY_ID,
  secret: KEY_SECRET,
  key: `usk_${KEY_ID}_${KEY_SECRET}`,
} as const;
