import { z } from 'zod';

const blankIsMissing = (raw: unknown) => (raw === '' ? undefined : raw);

const envSchema = z.object({
  NODE_ENV: z.enum(['development', 'production', 'test']).default('development'),
  /** `file:path` or the address of a libSQL server. */
  DATABASE_URL: z.preprocess(blankIsMissing, z.string().default('file:data/strandline.db')),
  DATABASE_AUTH_TOKEN: z.preprocess(blankIsMissing, z.string().optional()),
  /** The address under which people reach the server, where it cannot be read from the request. */
  STRANDLINE_ORIGIN: z.preprocess(blankIsMissing, z.url().optional()),
  STRANDLINE_LOG_LEVEL: z.preprocess(
    blankIsMissing,
    z.enum(['fatal', 'error', 'warn', 'info', 'debug', 'trace', 'silent']).optional(),
  ),
});

/** What the machine tells the server, checked once. */
export const env = envSchema.parse(process.env);
