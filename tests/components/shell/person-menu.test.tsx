import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { PersonMenu } from '@/components/shell/person-menu';
import type { FormState } from '@/components/ui/form-state';
import type { Viewer } from '@/lib/schemas/person';

const VIEWER: Viewer = {
  userId: 'u1',
  name: 'Iris Kern',
  email: 'iris@example.org',
  teamId: 't1',
  teamName: 'North',
  role: 'owner',
  invented: false,
  teams: [
    { id: 't1', name: 'North', role: 'owner' },
    { id: 't2', name: 'South', role: 'modeller' },
  ],
};

const answering = (answer: FormState<null>) =>
  vi.fn(async (_previous: FormState<null>, _input: FormData | object) => answer);

async function open(answer: FormState<null> = { ok: true }) {
  const signOut = answering(answer);
  const switchTeam = answering(answer);
  render(<PersonMenu viewer={VIEWER} theme="system" signOut={signOut} switchTeam={switchTeam} />);
  fireEvent.click(screen.getByRole('button', { name: 'Menu of Iris Kern' }));
  await screen.findByRole('menu');
  return { signOut, switchTeam };
}

afterEach(() => {
  delete document.documentElement.dataset.theme;
});

describe('PersonMenu', () => {
  it('changes to another team', async () => {
    const { switchTeam } = await open();
    fireEvent.click(screen.getByRole('menuitemradio', { name: /South/ }));
    await waitFor(() => expect(switchTeam).toHaveBeenCalledWith(null, { teamId: 't2' }));
  });

  it('shows a chosen appearance at once, keeps it for the server, and goes back to the system', async () => {
    await open();
    fireEvent.click(screen.getByRole('menuitemradio', { name: /Dark/ }));
    expect(document.documentElement.dataset.theme).toBe('dark');
    expect(document.cookie).toContain('strandline-theme=dark');
    fireEvent.click(screen.getByRole('button', { name: 'Menu of Iris Kern' }));
    const system = await screen.findByRole('menuitemradio', { name: /As the system/ });
    expect(system.getAttribute('aria-checked')).toBe('false');
    fireEvent.click(system);
    expect(document.documentElement.dataset.theme).toBeUndefined();
  });

  it('says why signing out was refused', async () => {
    const { signOut } = await open({ ok: false, message: 'Something went wrong.', fields: {} });
    fireEvent.click(screen.getByRole('menuitem', { name: 'Sign out' }));
    await screen.findByText('Something went wrong.');
    expect(signOut).toHaveBeenCalledOnce();
  });
});
