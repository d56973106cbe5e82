import type { Handle } from '@/db/access/context';
import { sessions } from '@/db/schema/sessions';
import { users } from '@/db/schema/users';
import { DrizzleSQLiteAdapter } from '@lucia-auth/adapter-drizzle';
import { Lucia, TimeSpan } from 'lucia';

/**
 * Sessions last 30 days from their last use; the cookie outlives them, because a server component
 * that prolongs a session cannot set a cookie.
 */
export function luciaOn(db: Handle) {
  return new Lucia(new DrizzleSQLiteAdapter(db, sessions, users), {
    sessionExpiresIn: new TimeSpan(30, 'd'),
    sessionCookie: { name: 'strandline_session', expires: false, attributes: { sameSite: 'lax' } },
    getSessionAttributes: ({ createdAt, device, teamId }) => ({ createdAt, device, teamId }),
    getUserAttributes: ({ name, email }) => ({ name, email }),
  });
}

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof luciaOn>;
    DatabaseSessionAttributes: { createdAt: Date; device: string; teamId: string | null };
    DatabaseUserAttributes: { name: string; email: string };
  }
}
