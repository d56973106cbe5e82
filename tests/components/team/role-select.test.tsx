import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { RoleSelect } from '@/components/team/role-select';
import type { FormState } from '@/components/ui/form-state';

function show(answer: FormState<null>) {
  const action = vi.fn(async (_previous: FormState<null>, _input: FormData | object) => answer);
  render(<RoleSelect action={action} userId="u2" name="Ines Kaltofen" role="analyst" />);
  return {
    action,
    select: screen.getByRole<HTMLSelectElement>('combobox', { name: 'Role of Ines Kaltofen' }),
  };
}

describe('RoleSelect', () => {
  it('changes the role as soon as another is chosen', async () => {
    const { action, select } = show({ ok: true });
    fireEvent.change(select, { target: { value: 'reviewer' } });
    await waitFor(() =>
      expect(action).toHaveBeenCalledExactlyOnceWith(null, { userId: 'u2', role: 'reviewer' }),
    );
  });

  it('puts the old role back and says why when refused', async () => {
    const { select } = show({ ok: false, message: 'A team keeps one owner.', fields: {} });
    fireEvent.change(select, { target: { value: 'owner' } });
    expect((await screen.findByRole('status')).textContent).toContain('A team keeps one owner.');
    await waitFor(() => expect(select.value).toBe('analyst'));
  });
});
