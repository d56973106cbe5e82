import 'server-only';

import type { Viewer } from '@/lib/schemas/person';

import { requestContext } from './context';

/** Who is signed in, for pages that show something to both; null when signed out. */
export async function currentViewer(): Promise<Viewer | null> {
  return (await requestContext()).viewer;
}
