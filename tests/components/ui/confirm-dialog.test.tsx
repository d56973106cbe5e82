import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import type { FormState } from '@/components/ui/form-state';

/** Behaviour after the alert dialog pattern of the WAI-ARIA Authoring Practices. */
function show(answer: FormState) {
  const action = vi.fn(async (_previous: FormState, _input: FormData | object) => answer);
  const onDone = vi.fn();
  render(
    <ConfirmDialog
      trigger={<Button>Discard…</Button>}
      title="Discard this fit?"
      confirmLabel="Discard the fit"
      action={action}
      input={{ id: 'f1' }}
      onDone={onDone}
    >
      <p>It cannot be brought back.</p>
    </ConfirmDialog>,
  );
  return { action, onDone };
}

const open = async () => {
  fireEvent.click(screen.getByRole('button', { name: 'Discard…' }));
  return screen.findByRole('alertdialog', { name: 'Discard this fit?' });
};

describe('ConfirmDialog', () => {
  it('asks first, and says what will be lost', async () => {
    const { action } = show({ ok: true });
    const dialog = await open();
    const description = document.getElementById(dialog.getAttribute('aria-describedby') ?? '');
    expect(description?.textContent).toBe('It cannot be brought back.');
    expect(action).not.toHaveBeenCalled();
  });

  it('does nothing when cancelled', async () => {
    const { action, onDone } = show({ ok: true });
    await open();
    fireEvent.click(screen.getByRole('button', { name: 'Cancel' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect(action).not.toHaveBeenCalled();
    expect(onDone).not.toHaveBeenCalled();
  });

  it('closes with Escape and does nothing', async () => {
    const { action } = show({ ok: true });
    const dialog = await open();
    fireEvent.keyDown(dialog, { key: 'Escape' });
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect(action).not.toHaveBeenCalled();
  });

  it('acts on what it was given, then closes', async () => {
    const { action, onDone } = show({ ok: true });
    await open();
    fireEvent.click(screen.getByRole('button', { name: 'Discard the fit' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect(action).toHaveBeenCalledExactlyOnceWith(null, { id: 'f1' });
    expect(onDone).toHaveBeenCalledOnce();
  });

  it('stays open and shows the reason when refused', async () => {
    const { onDone } = show({
      ok: false,
      message: 'Only who made a draft may discard it.',
      fields: {},
    });
    await open();
    fireEvent.click(screen.getByRole('button', { name: 'Discard the fit' }));
    const reason = await screen.findByRole('alert');
    expect(reason.textContent).toContain('Only who made a draft may discard it.');
    expect(screen.getByRole('alertdialog')).toBeTruthy();
    expect(onDone).not.toHaveBeenCalled();
  });
});
