import 'server-only';

import { read } from '@/app/_server/read';
import { signedIn } from '@/db/access/policy';

/** Who is signed in; anybody else is led to the sign-in page. */
export const readViewer = () => read(async (ctx) => signedIn(ctx));
