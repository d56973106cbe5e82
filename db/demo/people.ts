import type { DemoPerson } from './types';

const NAMES = [
  { key: 'owner', name: 'Edda Hollister' },
  { key: 'analyst', name: 'Ines Kaltofen' },
  { key: 'reviewer', name: 'Tomas Brandvik' },
  { key: 'modeller', name: 'Priya Ragnarsson' },
] as const;

/** Four invented people, one per role. */
export function demoPeople(): DemoPerson[] {
  return NAMES.map(({ key, name }) => ({
    key,
    name,
    email: `${name.toLowerCase().replace(' ', '.')}@northbank.example`,
    role: key,
    invented: true,
  }));
}
