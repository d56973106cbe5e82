import { z } from 'zod';

import { flagSchema, idSchema, momentSchema, optionalNumber, optionalText, text } from './common';

export const stoppingMetaSchema = z.object({
  name: text('Name', 80),
  layerStack: text('Layer stack', 200),
  origin: optionalText('Origin', 400),
  notes: optionalText('Notes', 4000),
});
export type StoppingMeta = z.input<typeof stoppingMetaSchema>;

export const stoppingReadingSchema = z.object({
  depthUnit: z.enum(['nm', 'A', 'um']),
  positionsAre: z.enum(['centres', 'edges']),
  weightsAre: z.enum(['counts', 'density']),
  /** Muons implanted per energy, where the file counts stops; gives the share that did not stop in the bins. */
  implantedPerEnergy: optionalNumber('Implanted muons', { above: 0 }),
  files: z
    .array(
      z.object({
        delimiter: z.enum(['comma', 'semicolon', 'tab', 'blanks']),
        decimal: z.enum(['point', 'comma']),
        /** Typed energy of a one-energy file; null reads it from the name or the headings. */
        energyKeV: optionalNumber('Energy', { above: 0, max: 1000 }),
        skipLines: z.array(z.int().min(1)).max(20_000),
      }),
    )
    .min(1)
    .max(200),
});
export type StoppingReading = z.input<typeof stoppingReadingSchema>;

/** The JSON part of an upload (`details`); files travel in the repeated multipart field `file`, in the order of reading.files. */
export const stoppingUploadSchema = z.object({
  meta: stoppingMetaSchema,
  reading: stoppingReadingSchema,
});

export const createStoppingSetSchema = stoppingUploadSchema.extend({
  files: z
    .array(z.object({ name: text('File name', 200), bytes: z.instanceof(Uint8Array) }))
    .min(1)
    .max(200),
});

export const editStoppingSetSchema = z.object({ id: idSchema, meta: stoppingMetaSchema });

export const listStoppingSetsSchema = z.object({ archived: flagSchema });

export const stoppingSetRowSchema = z.object({
  id: idSchema,
  name: z.string(),
  layerStack: z.string(),
  origin: z.string(),
  notes: z.string(),
  energiesKeV: z.array(z.number()),
  bins: z.number(),
  sha256: z.string(),
  invented: z.boolean(),
  archivedAt: momentSchema.nullable(),
  createdAt: momentSchema,
  createdBy: z.string(),
});
export type StoppingSetRow = z.infer<typeof stoppingSetRowSchema>;

export const stoppingSetSchema = stoppingSetRowSchema.extend({
  warnings: z.array(z.string()),
  files: z.array(
    z.object({ id: idSchema, name: z.string(), sha256: z.string(), byteLength: z.number() }),
  ),
  profiles: z.array(
    z.object({
      energyKeV: z.number(),
      edgesNm: z.array(z.number()),
      mass: z.array(z.number()),
      lostShare: z.number().nullable(),
    }),
  ),
});
export type StoppingSetAnswer = z.infer<typeof stoppingSetSchema>;
