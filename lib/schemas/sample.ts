import { z } from 'zod';

import { flagSchema, idSchema, momentSchema, optionalNumber, optionalText, text } from './common';

export const CARRIERS = ['electrons', 'holes'] as const;

export const sampleInputSchema = z.object({
  name: text('Name', 80),
  material: text('Material', 80),
  carrier: z.enum(CARRIERS),
  dopingPerCm3: optionalNumber('Doping', { above: 0, max: 1e22 }),
  dopingSigmaPerCm3: optionalNumber('Doping uncertainty', { min: 0, max: 1e22 }),
  capMaterial: optionalText('Cap layer', 80),
  capThicknessNm: optionalNumber('Cap thickness', { min: 0, max: 10_000 }),
  treatment: optionalText('Treatment', 200),
  notes: optionalText('Notes', 4000),
});
export type SampleInput = z.input<typeof sampleInputSchema>;

export const editSampleSchema = sampleInputSchema.extend({ id: idSchema });
export const listSamplesSchema = z.object({ archived: flagSchema });

export const sampleSchema = z.object({
  id: idSchema,
  name: z.string(),
  material: z.string(),
  carrier: z.enum(CARRIERS),
  dopingPerCm3: z.number().nullable(),
  dopingSigmaPerCm3: z.number().nullable(),
  capMaterial: z.string(),
  capThicknessNm: z.number().nullable(),
  treatment: z.string(),
  notes: z.string(),
  invented: z.boolean(),
  archivedAt: momentSchema.nullable(),
  createdAt: momentSchema,
  createdBy: z.string(),
});
export type Sample = z.infer<typeof sampleSchema>;

export const sampleRowSchema = sampleSchema.extend({
  scans: z.number(),
  fits: z.number(),
  issuedProfiles: z.number(),
});
export type SampleRow = z.infer<typeof sampleRowSchema>;
