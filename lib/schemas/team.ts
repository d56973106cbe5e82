import { z } from 'zod';

import { idSchema, momentSchema, roleSchema } from './common';
import { emailSchema } from './person';

export const invitePersonSchema = z.object({ email: emailSchema, role: roleSchema });
export const changeRoleSchema = z.object({ userId: idSchema, role: roleSchema });
export const removePersonSchema = z.object({ userId: idSchema });
export const switchTeamSchema = z.object({ teamId: idSchema });

export const teamSchema = z.object({
  id: idSchema,
  name: z.string(),
  people: z.array(
    z.object({
      userId: idSchema,
      name: z.string(),
      email: z.string(),
      role: roleSchema,
      joinedAt: momentSchema,
    }),
  ),
  /** Open invitations, for owners only. */
  invitations: z.array(
    z.object({ id: idSchema, email: z.string(), role: roleSchema, expiresAt: momentSchema }),
  ),
});
export type Team = z.infer<typeof teamSchema>;

export const auditEntrySchema = z.object({
  id: z.string(),
  at: momentSchema,
  person: z.string(),
  /** What was done, such as "accept-fit". */
  verb: z.string(),
  subject: z.string(),
});
export type AuditEntry = z.infer<typeof auditEntrySchema>;
