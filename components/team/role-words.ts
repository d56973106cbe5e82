import type { Role } from '@/lib/schemas/common';

/** What each role can do, in one line for the person who chooses it. */
export const ROLE_WORDS: Record<Role, { label: string; can: string }> = {
  owner: { label: 'Owner', can: 'everything, and manages people and their roles' },
  analyst: { label: 'Analyst', can: 'loads scans and stopping sets, fits, sends fits to review' },
  reviewer: { label: 'Reviewer', can: 'compares fits, accepts or returns them' },
  modeller: { label: 'Modeller', can: 'reads, comments and exports issued profiles' },
};
