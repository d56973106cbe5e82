import { MAX_ENERGIES } from '@/lib/inversion/constants';
import { z } from 'zod';

import { flagSchema, idSchema, momentSchema, optionalNumber, optionalText, text } from './common';

export const OBSERVABLES = ['fraction', 'rate'] as const;
export const ILLUMINATIONS = ['dark', 'illuminated', 'after illumination'] as const;

/** What is known of a scan besides its points. */
export const scanMetaSchema = z.object({
  name: text('Name', 80),
  observable: z.enum(OBSERVABLES),
  temperatureK: optionalNumber('Temperature', { above: 0, max: 2000 }),
  fieldMT: optionalNumber('Field', { min: 0, max: 20_000 }),
  illumination: z.enum(ILLUMINATIONS),
  measuredOn: z.union([z.literal(''), z.iso.date('Date: expected year-month-day.')]).default(''),
  notes: optionalText('Notes', 4000),
});
export type ScanMeta = z.input<typeof scanMetaSchema>;

/** How the columns of a file are read (0-based indices). */
export const scanReadingSchema = z.object({
  delimiter: z.enum(['comma', 'semicolon', 'tab', 'blanks']),
  decimal: z.enum(['point', 'comma']),
  columns: z.object({
    energy: z.int().min(0),
    value: z.int().min(0),
    sigma: z.int().min(0),
    note: z.int().min(0).nullable(),
    counts: z.int().min(0).nullable(),
  }),
  energyUnit: z.enum(['keV', 'eV']),
  asymmetry: z
    .object({ maximum: z.number().positive().max(1), sigma: z.number().min(0).max(1) })
    .nullable(),
  /** Lines that the person switched off by name. */
  skipLines: z.array(z.int().min(1)).max(20_000),
});
export type ScanReading = z.infer<typeof scanReadingSchema>;

export const typedPointSchema = z.object({
  energyKeV: z.number().positive().max(1000),
  value: z.number(),
  sigma: z.number().positive(),
  enabled: z.boolean(),
  note: z.string().max(200),
});
export type TypedPoint = z.infer<typeof typedPointSchema>;

/** A scan comes from a file (multipart: `file` + `meta` JSON) or from typed points. */
export const createScanSchema = z.object({
  sampleId: idSchema,
  meta: scanMetaSchema,
  source: z.discriminatedUnion('kind', [
    z.object({
      kind: z.literal('file'),
      name: text('File name', 200),
      bytes: z.instanceof(Uint8Array),
      reading: scanReadingSchema,
    }),
    z.object({
      kind: z.literal('typed'),
      points: z.array(typedPointSchema).min(1).max(MAX_ENERGIES),
    }),
  ]),
});

export const editScanSchema = z.object({
  id: idSchema,
  meta: scanMetaSchema,
  /** null leaves the points as they are. */
  points: z.array(typedPointSchema).min(1).max(MAX_ENERGIES).nullable(),
});

export const listScansSchema = z.object({ sampleId: idSchema.optional(), archived: flagSchema });

export const scanSchema = z.object({
  id: idSchema,
  sampleId: idSchema,
  sampleName: z.string(),
  name: z.string(),
  observable: z.enum(OBSERVABLES),
  temperatureK: z.number().nullable(),
  fieldMT: z.number().nullable(),
  illumination: z.enum(ILLUMINATIONS),
  measuredOn: z.string(),
  notes: z.string(),
  points: z.array(typedPointSchema),
  /** σ of the maximum asymmetry over the maximum asymmetry: a scale error common to all points. */
  asymmetryScaleError: z.number().nullable(),
  file: z
    .object({ id: idSchema, name: z.string(), sha256: z.string(), byteLength: z.number() })
    .nullable(),
  /** SHA-256 of the points in canonical form. */
  pointsSha256: z.string(),
  invented: z.boolean(),
  archivedAt: momentSchema.nullable(),
  createdAt: momentSchema,
  createdBy: z.string(),
});
export type Scan = z.infer<typeof scanSchema>;
