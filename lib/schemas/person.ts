import { z } from 'zod';

import { idSchema, momentSchema, roleSchema, text } from './common';

export const emailSchema = z.preprocess(
  (raw) => (typeof raw === 'string' ? raw.trim().toLowerCase() : raw),
  z.email('E-mail: expected an address such as name@example.org.').max(200),
);
const newPassword = z
  .string('Password: at least 10 characters.')
  .min(10, 'Password: at least 10 characters.')
  .max(200, 'Password: at most 200 characters.');

export const signUpSchema = z.object({
  name: text('Name', 80),
  email: emailSchema,
  password: newPassword,
  teamName: text('Team', 80),
});

export const signInSchema = z.object({
  email: emailSchema,
  password: z.string('Password: write it here.').min(1, 'Password: write it here.').max(200),
});

/** With an invitation: a new person gives name and password, a known one only the password. */
export const acceptInvitationSchema = z.object({
  token: z.string().min(20).max(200),
  name: z.string().trim().max(80).default(''),
  password: newPassword,
});

export const readInvitationSchema = acceptInvitationSchema.pick({ token: true });
/** A session is named by the hash of its token. */
export const revokeSessionSchema = z.object({ id: z.string().min(1).max(200) });

export const invitationSchema = z.object({
  email: z.string(),
  role: roleSchema,
  teamName: z.string(),
  known: z.boolean(),
});
export type Invitation = z.infer<typeof invitationSchema>;

export const sessionRowSchema = z.object({
  id: z.string(),
  current: z.boolean(),
  device: z.string(),
  createdAt: momentSchema,
  expiresAt: momentSchema,
});
export type SessionRow = z.infer<typeof sessionRowSchema>;

/** Who is signed in, in which team, with which role. */
export const viewerSchema = z.object({
  userId: idSchema,
  name: z.string(),
  email: z.string(),
  teamId: idSchema,
  teamName: z.string(),
  role: roleSchema,
  /** The team's data come from the demo generator. */
  invented: z.boolean(),
  teams: z.array(z.object({ id: idSchema, name: z.string(), role: roleSchema })),
});
export type Viewer = z.infer<typeof viewerSchema>;
