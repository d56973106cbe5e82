import { auditLines } from '@/db/schema/audit-lines';

import type { Handle } from './context';

interface AuditLine {
  by: { teamId: string; userId: string };
  at: Date;
  /** Such as "accept-fit". */
  verb: string;
  subject: string;
}

/** Written in the transaction of the change itself, so that neither stands without the other. */
export async function audit(tx: Handle, line: AuditLine): Promise<void> {
  await tx.insert(auditLines).values({
    teamId: line.by.teamId,
    personId: line.by.userId,
    at: line.at,
    verb: line.verb,
    subject: line.subject,
  });
}
