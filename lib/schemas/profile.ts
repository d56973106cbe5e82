import { z } from 'zod';

import { idSchema, momentSchema, requiredNumber } from './common';
import { fitSchema } from './fit';

export const issuedProfileRowSchema = z.object({
  id: idSchema,
  /** SL-2026-014 */
  number: z.string(),
  fitId: idSchema,
  fitName: z.string(),
  sampleId: idSchema,
  sampleName: z.string(),
  material: z.string(),
  scanName: z.string(),
  profile: fitSchema.shape.profile,
  edge: fitSchema.shape.edge,
  width: fitSchema.shape.width,
  issuedAt: momentSchema,
  issuedBy: z.string(),
  fittedBy: z.string(),
  invented: z.boolean(),
});
export type IssuedProfileRow = z.infer<typeof issuedProfileRowSchema>;

export const issuedProfileSchema = issuedProfileRowSchema.extend({
  citation: z.string(),
  fit: fitSchema,
  exports: z.array(z.object({ person: z.string(), at: momentSchema, grid: z.string() })),
});
export type IssuedProfile = z.infer<typeof issuedProfileSchema>;

/** Query of a CSV export. */
export const exportProfileSchema = z.object({
  id: idSchema,
  grid: z.enum(['fit', 'uniform']).default('fit'),
  stepNm: requiredNumber('Step', { min: 0.01, max: 1000 }).default(1),
  depthUnit: z.enum(['nm', 'um', 'cm']).default('nm'),
  concentrationUnit: z.enum(['cm-3', 'm-3']).default('cm-3'),
});

export const listIssuedProfilesSchema = z.object({
  /** Words that number, sample, material, scan or fit must contain. */
  query: z.string().trim().max(200).default(''),
});
