import { MAX_ENERGIES, MAX_RESAMPLES } from '@/lib/inversion/constants';
import { z } from 'zod';

import { idSchema, momentSchema, optionalText, text } from './common';
import { OBSERVABLES } from './scan';

/** The trial profiles that can be saved; the library knows more. */
export const PROFILE_KINDS = ['sharp', 'graded'] as const;
export type ProfileKind = (typeof PROFILE_KINDS)[number];
export const PARAMETER_NAMES = [
  'edgeDepthNm',
  'edgeWidthNm',
  'layerThicknessNm',
  'farEdgeWidthNm',
  'surfacePotentialEv',
  'bulkPerCm3',
  'levelTop',
  'levelBulk',
  'levelCap',
  'depthScale',
] as const;
export const FIT_STATES = ['draft', 'submitted', 'accepted', 'returned'] as const;

const parameterSettingSchema = z.object({
  held: z.boolean(),
  value: z.number().nullable(),
  prior: z.object({ mean: z.number(), sigma: z.number().positive() }).nullable(),
  /** Where a held value or prior comes from, such as "four-point resistivity". */
  origin: z.string().max(200).default(''),
});

/** The settings of a fit: everything but the points and the stopping set, which are named by id. */
export const fitSpecSchema = z.object({
  profile: z.enum(PROFILE_KINDS),
  polarity: z.enum(['depletion', 'accumulation']),
  response: z.discriminatedUnion('kind', [
    z.object({ kind: z.literal('two-level') }),
    z.object({
      kind: z.literal('capture-rate'),
      gammaCm3PerS: z.number().positive(),
      gammaSigmaCm3PerS: z.number().min(0).nullable(),
      baselinePerUs: z.number().min(0),
    }),
  ]),
  carriers: z.object({
    bulkPerCm3: z.number().positive().nullable(),
    bulkSigmaPerCm3: z.number().min(0).nullable(),
    topPerCm3: z.number().min(0).nullable(),
  }),
  capThicknessNm: z.number().min(0).max(10_000),
  parameters: z.partialRecord(z.enum(PARAMETER_NAMES), parameterSettingSchema),
  /** Energies (keV) switched off for this fit, besides those switched off in the scan. */
  switchedOffKeV: z.array(z.number()).max(MAX_ENERGIES),
  seed: z.int().min(0).max(4_294_967_295),
  resamples: z.int().min(0).max(MAX_RESAMPLES),
});
export type FitSpec = z.infer<typeof fitSpecSchema>;

const intervalSchema = z.tuple([z.number().nullable(), z.number().nullable()]).readonly();

export const fitParameterSchema = z.object({
  name: z.enum(PARAMETER_NAMES),
  value: z.number(),
  sigma: z.number().nullable(),
  interval68: intervalSchema,
  interval95: intervalSchema,
  held: z.boolean(),
  atBound: z.enum(['lower', 'upper']).nullable(),
  symmetric: z.boolean(),
});

export const residualSchema = z.object({
  energyKeV: z.number(),
  observed: z.number(),
  sigma: z.number(),
  predicted: z.number(),
  reduced: z.number(),
  enabled: z.boolean(),
  interpolated: z.boolean(),
});

export const fitAnswerSchema = z.object({
  status: z.enum(['converged', 'stalled', 'iteration-limit']),
  parameters: z.array(fitParameterSchema).min(1).max(50),
  chiSquare: z.number(),
  dataChiSquare: z.number(),
  degreesOfFreedom: z.number(),
  pValue: z.number().nullable(),
  freeParameters: z.number(),
  aicc: z.number().nullable(),
  bic: z.number(),
  covariance: z.discriminatedUnion('ok', [
    z.object({
      ok: z.literal(true),
      names: z.array(z.enum(PARAMETER_NAMES)),
      matrix: z.array(z.array(z.number())),
      correlation: z.array(z.array(z.number())),
    }),
    z.object({ ok: z.literal(false), reason: z.string() }),
  ]),
  residuals: z.array(residualSchema).max(MAX_ENERGIES),
  evidence: z.object({
    folds: z.number(),
    starts: z.number(),
    iterations: z.number(),
    predictedReduction: z.number(),
  }),
});

export const carrierProfileSchema = z.object({
  unit: z.enum(['populated share', 'cm⁻³']),
  bands: z.enum(['delta', 'bootstrap']).nullable(),
  points: z
    .array(
      z.object({
        depthNm: z.number(),
        value: z.number(),
        lower68: z.number().nullable(),
        upper68: z.number().nullable(),
        lower95: z.number().nullable(),
        upper95: z.number().nullable(),
        flag: z.enum(['supported', 'beyond reach', 'below floor']),
      }),
    )
    .max(2000),
  reachNm: z.number(),
  floor: z.number().nullable(),
});

export const checkSchema = z.object({
  id: z.string(),
  state: z.enum(['fine', 'caution', 'problem']),
  message: z.string(),
});

/** What the browser claims; the server recomputes all of it from the stored inputs. */
export const saveFitSchema = z.object({
  scanId: idSchema,
  stoppingSetId: idSchema,
  name: text('Name', 80),
  notes: optionalText('Notes', 4000),
  /** The fit that this one came from. */
  parentFitId: idSchema.nullable(),
  spec: fitSpecSchema,
  claimed: z.object({ answer: fitAnswerSchema, profile: carrierProfileSchema }),
});
export type SaveFitInput = z.input<typeof saveFitSchema>;

export const fitRowSchema = z.object({
  id: idSchema,
  name: z.string(),
  state: z.enum(FIT_STATES),
  sampleId: idSchema,
  sampleName: z.string(),
  scanId: idSchema,
  scanName: z.string(),
  stoppingSetId: idSchema,
  stoppingSetName: z.string(),
  profile: z.enum(PROFILE_KINDS),
  edge: fitParameterSchema.nullable(),
  width: fitParameterSchema.nullable(),
  chiSquare: z.number(),
  degreesOfFreedom: z.number(),
  aicc: z.number().nullable(),
  createdBy: z.string(),
  createdById: idSchema,
  createdAt: momentSchema,
  invented: z.boolean(),
  issuedProfileId: idSchema.nullable(),
  issuedNumber: z.string().nullable(),
});
export type FitRow = z.infer<typeof fitRowSchema>;

export const REVIEW_EVENTS = ['submitted', 'accepted', 'returned', 'comment'] as const;
export const reviewEventSchema = z.object({
  id: idSchema,
  kind: z.enum(REVIEW_EVENTS),
  body: z.string(),
  /** What a comment points at, such as "point 14 keV", "depth 80 nm" or "check edge-inside-reach"; empty for the whole fit. */
  target: z.string(),
  person: z.string(),
  at: momentSchema,
});
export type ReviewEvent = z.infer<typeof reviewEventSchema>;

export const fitSchema = fitRowSchema.extend({
  notes: z.string(),
  parent: z.object({ id: idSchema, name: z.string() }).nullable(),
  observable: z.enum(OBSERVABLES),
  spec: fitSpecSchema,
  /** The points as they were when the fit was frozen. */
  points: z.array(
    z.object({ energyKeV: z.number(), value: z.number(), sigma: z.number(), enabled: z.boolean() }),
  ),
  answer: fitAnswerSchema,
  carrierProfile: carrierProfileSchema,
  checks: z.array(checkSchema),
  hashes: z.object({ points: z.string(), stoppingSet: z.string(), inputs: z.string() }),
  /** The scan was edited after the fit was frozen. */
  scanChangedSince: z.boolean(),
  events: z.array(reviewEventSchema),
  /** What the viewer may do now. */
  may: z.object({
    submit: z.boolean(),
    accept: z.boolean(),
    return: z.boolean(),
    comment: z.boolean(),
    revise: z.boolean(),
    discard: z.boolean(),
  }),
});
export type Fit = z.infer<typeof fitSchema>;

export const returnFitSchema = z.object({ id: idSchema, reason: text('Reason', 2000) });
export const submitFitSchema = z.object({ id: idSchema, note: optionalText('Note', 2000) });
export const acceptFitSchema = z.object({ id: idSchema, note: optionalText('Note', 2000) });
export const commentFitSchema = z.object({
  id: idSchema,
  body: text('Comment', 2000),
  target: optionalText('About', 80),
});
export const compareFitsSchema = z.object({
  ids: z.array(idSchema).min(2, 'Choose two fits or more.').max(8),
});

export const listFitsSchema = z.object({
  scanId: idSchema.optional(),
  sampleId: idSchema.optional(),
  state: z.enum(FIT_STATES).optional(),
});
