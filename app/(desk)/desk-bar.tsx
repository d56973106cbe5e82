import { cookies } from 'next/headers';

import { read } from '@/app/_server/read';
import { TopBar } from '@/components/shell/top-bar';
import { THEME_COOKIE, themeFrom } from '@/components/shell/theme';
import { mayAct } from '@/db/access/policy';
import { listReviews } from '@/db/access/review/list-reviews';
import type { Viewer } from '@/lib/schemas/person';

import { signOutAction } from '../(public)/actions';
import { switchTeamAction } from './team/actions';

export async function DeskBar({ viewer }: { viewer: Viewer }) {
  const theme = themeFrom((await cookies()).get(THEME_COOKIE)?.value);
  return (
    <TopBar
      viewer={viewer}
      theme={theme}
      waiting={await countWaiting(viewer)}
      signOut={signOutAction}
      switchTeam={switchTeamAction}
    />
  );
}

/** Submitted fits that this person may decide on: everybody's but their own. */
async function countWaiting(viewer: Viewer): Promise<number> {
  if (!mayAct(viewer, 'decide')) return 0;
  const submitted = await read(listReviews);
  return submitted.filter((fit) => fit.createdById !== viewer.userId).length;
}
