import { defaultAssumptions, type Assumptions } from '@/components/fit-desk/assumptions';
import type { Sample } from '@/lib/schemas/sample';

export const sample: Sample = {
  id: '019a0000-0000-7000-8000-000000000001',
  name: 'HX-204',
  material: 'Ge',
  carrier: 'holes',
  dopingPerCm3: 6.2e15,
  dopingSigmaPerCm3: 4e14,
  capMaterial: 'alumina',
  capThicknessNm: 4,
  treatment: '',
  notes: '',
  invented: true,
  archivedAt: null,
  createdAt: '2026-01-01T00:00:00.000Z',
  createdBy: 'Ines Kaltofen',
};

export const SET_ID = '019a0000-0000-7000-8000-000000000002';

export const assumptions = (observable: 'fraction' | 'rate' = 'fraction'): Assumptions =>
  defaultAssumptions({ observable }, sample, SET_ID);
