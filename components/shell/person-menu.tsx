'use client';

import { startTransition, useActionState, useState } from 'react';

import type { FormActionFunction } from '@/components/ui/form-state';
import { Menu } from '@/components/ui/menu';
import {
  MenuGroup,
  MenuItem,
  MenuLine,
  MenuLink,
  MenuRadioGroup,
} from '@/components/ui/menu-items';
import type { Viewer } from '@/lib/schemas/person';

import { initials } from './initials';
import { showTheme } from './show-theme';
import type { Theme } from './theme';
import { ThemeGroup } from './theme-group';

type PersonMenuProps = {
  viewer: Viewer;
  theme: Theme;
  signOut: FormActionFunction<null>;
  switchTeam: FormActionFunction<null>;
};

export function PersonMenu({ viewer, theme, signOut, switchTeam }: PersonMenuProps) {
  const [shownTheme, setShownTheme] = useState(theme);
  const [signedOut, leave] = useActionState(signOut, null);
  const [switched, change] = useActionState(switchTeam, null);
  const refusal = [signedOut, switched].find((state) => state?.ok === false);

  return (
    <>
      <span role="status" className="text-[0.8125rem] text-coral-ink">
        {refusal?.ok === false && refusal.message}
      </span>
      <Menu align="end" trigger={<PersonButton name={viewer.name} />}>
        <MenuGroup label={<WhoIsSignedIn viewer={viewer} />}>
          <MenuLink href="/account/sessions">Sessions</MenuLink>
          <MenuLink href="/help">Help</MenuLink>
        </MenuGroup>
        <MenuLine />
        {viewer.teams.length > 1 && (
          <>
            <MenuRadioGroup
              label="Team"
              value={viewer.teamId}
              options={viewer.teams.map(({ id, name, role }) => ({
                value: id,
                label: `${name} (${role})`,
              }))}
              onChange={(teamId) => startTransition(() => change({ teamId }))}
            />
            <MenuLine />
          </>
        )}
        <ThemeGroup
          theme={shownTheme}
          onChange={(next) => {
            setShownTheme(next);
            showTheme(next);
          }}
        />
        <MenuLine />
        <MenuItem onSelect={() => startTransition(() => leave({}))}>Sign out</MenuItem>
      </Menu>
    </>
  );
}

function WhoIsSignedIn({ viewer }: { viewer: Viewer }) {
  return (
    <>
      <span className="block text-sm font-semibold text-ink">{viewer.name}</span>
      {viewer.email}
      <span className="block">
        {viewer.role} in {viewer.teamName}
      </span>
    </>
  );
}

/** Base UI hands its own properties to the element that opens a menu. */
function PersonButton({ name, ...rest }: { name: string } & React.ComponentProps<'button'>) {
  return (
    <button
      type="button"
      {...rest}
      aria-label={`Menu of ${name}`}
      className="grid size-8 place-items-center rounded-full bg-kelp text-xs font-semibold text-paper hover:ring-2 hover:ring-kelp/40"
    >
      {initials(name)}
    </button>
  );
}
