import { exportProfileSchema } from '@/lib/schemas/profile';

export const GRIDS = exportProfileSchema.shape.grid.unwrap().options;
export const DEPTH_UNITS = exportProfileSchema.shape.depthUnit.unwrap().options;
export const CONCENTRATION_UNITS = exportProfileSchema.shape.concentrationUnit.unwrap().options;

/** What a person chose; the step stays as it was typed. */
export interface ExportChoice {
  grid: (typeof GRIDS)[number];
  step: string;
  depthUnit: (typeof DEPTH_UNITS)[number];
  concentrationUnit: (typeof CONCENTRATION_UNITS)[number];
}

type Query = Record<string, string | string[] | undefined>;

/** The choice in an address; what is missing or unknown is the default. */
export function exportChoiceOf(query: Query): ExportChoice {
  const one = <Value extends string>(name: string, options: readonly Value[], otherwise: Value) =>
    options.find((option) => option === query[name]) ?? otherwise;
  return {
    grid: one('grid', GRIDS, 'fit'),
    step: typeof query.stepNm === 'string' ? query.stepNm : '1',
    depthUnit: one('depthUnit', DEPTH_UNITS, 'nm'),
    concentrationUnit: one('concentrationUnit', CONCENTRATION_UNITS, 'cm-3'),
  };
}

/** The query of the export: the step only where it means something. */
export function exportQuery({ grid, step, depthUnit, concentrationUnit }: ExportChoice): string {
  const query = new URLSearchParams({ grid, depthUnit, concentrationUnit });
  if (grid === 'uniform') query.set('stepNm', step.trim().replace(',', '.'));
  return query.toString();
}

export const exportPath = (profileId: string, choice: ExportChoice): string =>
  `/api/profiles/${profileId}/export?${exportQuery(choice)}`;

export type StepReading =
  { ok: true; stepNm: number; rows: number } | { ok: false; message: string };

/** The step of a uniform grid, by the rule of the server's own schema, and how many rows it makes. */
export function readStep(step: string, endNm: number, maxRows: number): StepReading {
  const read = exportProfileSchema.shape.stepNm.safeParse(step);
  if (!read.success) {
    return { ok: false, message: read.error.issues[0]?.message ?? 'Step: expected a number.' };
  }
  const rows = uniformRows(endNm, read.data);
  return rows > maxRows
    ? {
        ok: false,
        message: `Step: ${read.data} nm makes ${rows.toLocaleString('en')} rows; at most ${maxRows.toLocaleString('en')} are written. Choose a larger step.`,
      }
    : { ok: true, stepNm: read.data, rows };
}

/** Depths 0, step, 2·step … down to the end; the small term keeps an end that is a whole number of steps. */
export function uniformRows(endNm: number, stepNm: number): number {
  return Math.floor(endNm / stepNm + 1e-9) + 1;
}
