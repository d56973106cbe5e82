import { InventedMark } from '@/components/ui/invented-mark';
import type { FormActionFunction } from '@/components/ui/form-state';
import type { Viewer } from '@/lib/schemas/person';

import { MainNav } from './main-nav';
import { PersonMenu } from './person-menu';
import type { Theme } from './theme';
import { Wordmark } from './wordmark';

type TopBarProps = {
  viewer: Viewer;
  theme: Theme;
  waiting: number;
  signOut: FormActionFunction<null>;
  switchTeam: FormActionFunction<null>;
};

export function TopBar({ viewer, theme, waiting, signOut, switchTeam }: TopBarProps) {
  return (
    <header className="no-print border-b border-rule">
      <div className="page flex min-h-13 flex-wrap items-center gap-x-3 gap-y-1 py-1 sm:gap-x-5 lg:gap-x-7 lg:py-0">
        <Wordmark />
        <MainNav waiting={waiting} />
        <div className="ml-auto flex min-w-0 items-center gap-3 text-sm">
          {viewer.invented && <InventedMark className="hidden sm:inline-flex" />}
          <span className="hidden truncate text-ink-2 md:block">{viewer.teamName}</span>
          <PersonMenu viewer={viewer} theme={theme} signOut={signOut} switchTeam={switchTeam} />
        </div>
      </div>
    </header>
  );
}
