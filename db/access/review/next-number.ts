import type { Handle } from '@/db/access/context';
import { issuedProfiles } from '@/db/schema/issued-profiles';
import { and, eq, max } from 'drizzle-orm';

/**
 * SL-YYYY-NNN, counted per team and year. Writers take turns and a failed transaction takes its
 * number back with it, so there are no gaps; the unique index is the last word.
 */
export async function nextNumber(tx: Handle, teamId: string, year: number) {
  const [last] = await tx
    .select({ sequence: max(issuedProfiles.sequence) })
    .from(issuedProfiles)
    .where(and(eq(issuedProfiles.teamId, teamId), eq(issuedProfiles.year, year)));
  const sequence = (last?.sequence ?? 0) + 1;
  return { year, sequence, number: `SL-${year}-${String(sequence).padStart(3, '0')}` };
}
