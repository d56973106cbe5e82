import type { Handle } from '@/db/access/context';
import { fromBlob } from '@/db/access/float-blob';
import { stoppingProfiles } from '@/db/schema/stopping-profiles';
import type { StoppingSet } from '@/lib/inversion/index';
import { asc, eq } from 'drizzle-orm';

/** The profiles exactly as they were stored. The caller has checked whose set it is. */
export async function loadStoppingSet(db: Handle, stoppingSetId: string): Promise<StoppingSet> {
  const rows = await db
    .select()
    .from(stoppingProfiles)
    .where(eq(stoppingProfiles.stoppingSetId, stoppingSetId))
    .orderBy(asc(stoppingProfiles.energyKeV));
  return {
    profiles: rows.map(({ energyKeV, edgesNm, mass, lostShare }) => ({
      energyKeV,
      edgesNm: fromBlob(edgesNm),
      mass: fromBlob(mass),
      lostShare,
      interpolatedBetween: null,
    })),
  };
}
