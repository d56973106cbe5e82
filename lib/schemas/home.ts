import { z } from 'zod';

import { fitRowSchema } from './fit';
import { issuedProfileRowSchema } from './profile';
import { sampleRowSchema } from './sample';

/** What waits for the viewer and what happened lately. */
export const homeSchema = z.object({
  /** Fits that wait for the viewer: for a reviewer those submitted by others, for an analyst their own returned ones and drafts. */
  waiting: z.array(fitRowSchema),
  recentFits: z.array(fitRowSchema),
  recentProfiles: z.array(issuedProfileRowSchema),
  samples: z.array(sampleRowSchema),
  counts: z.object({
    samples: z.number(),
    scans: z.number(),
    stoppingSets: z.number(),
    fits: z.number(),
  }),
});
export type Home = z.infer<typeof homeSchema>;
