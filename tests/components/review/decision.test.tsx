import { cleanup, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { CommentForm } from '@/components/review/comment-form';
import { commentTargets } from '@/components/review/comment-targets';
import { Decision } from '@/components/review/decision';
import { ReviewQueue } from '@/components/review/review-queue';
import { ReviewStanding } from '@/components/review/review-standing';

import { makeFit } from './make-fit';

afterEach(cleanup);

const refuse = (message: string, fields: Record<string, string> = {}) =>
  vi.fn(async () => ({ ok: false as const, message, fields }));
const sentFields = (data: FormData | object | undefined) =>
  data instanceof FormData ? Object.fromEntries(data) : data;
const both = { accept: true, return: true };

function renderDecision(changes: Partial<React.ComponentProps<typeof Decision>> = {}) {
  const acceptAction = vi.fn(async (_before: unknown, _data: FormData | object) => ({
    ok: true as const,
    answer: { issuedProfileId: 'p1', number: 'SL-2026-003' },
  }));
  const returnAction = vi.fn(async () => ({ ok: true as const, answer: null }));
  const props = { fitId: 'f1', fitName: 'Edge fit', may: both, acceptAction, returnAction };
  render(<Decision {...props} {...changes} />);
  return { acceptAction, returnAction };
}

describe('accepting', () => {
  it('says what will happen and that it cannot be undone, then asks the server', async () => {
    const { acceptAction } = renderDecision();
    fireEvent.click(screen.getByRole('button', { name: 'Accept…' }));
    const dialog = await screen.findByRole('alertdialog');
    expect(dialog.textContent).toContain('numbered issued profile');
    expect(dialog.textContent).toContain('cannot be undone');
    expect(acceptAction).not.toHaveBeenCalled();
    fireEvent.click(within(dialog).getByRole('button', { name: 'Accept and issue' }));
    await waitFor(() => expect(acceptAction).toHaveBeenCalled());
    expect(sentFields(acceptAction.mock.calls[0]?.[1])).toEqual({ id: 'f1', note: '' });
  });

  it('stays open with the sentence of the server when it refuses', async () => {
    renderDecision({
      acceptAction: refuse('You made this fit; someone else has to decide on it.'),
    });
    fireEvent.click(screen.getByRole('button', { name: 'Accept…' }));
    const dialog = await screen.findByRole('alertdialog');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Accept and issue' }));
    expect((await within(dialog).findByRole('alert')).textContent).toContain(
      'You made this fit; someone else has to decide on it.',
    );
    expect(dialog.isConnected).toBe(true);
  });
});

describe('returning', () => {
  it('keeps what was written when the reason is refused', async () => {
    renderDecision({
      returnAction: refuse('Some entries need attention.', { reason: 'Reason: too long.' }),
    });
    fireEvent.click(screen.getByRole('button', { name: 'Return…' }));
    const dialog = await screen.findByRole('alertdialog');
    const reason = within(dialog).getByLabelText('Reason');
    fireEvent.change(reason, { target: { value: 'The sharp edge is missing.' } });
    fireEvent.click(within(dialog).getByRole('button', { name: 'Return the fit' }));
    expect(await within(dialog).findByText('Reason: too long.')).toBeTruthy();
    expect(within(dialog).getByLabelText<HTMLTextAreaElement>('Reason').value).toBe(
      'The sharp edge is missing.',
    );
  });

  it('closes when the server has it', async () => {
    const { returnAction } = renderDecision();
    fireEvent.click(screen.getByRole('button', { name: 'Return…' }));
    const dialog = await screen.findByRole('alertdialog');
    fireEvent.click(within(dialog).getByRole('button', { name: 'Return the fit' }));
    await waitFor(() => expect(screen.queryByRole('alertdialog')).toBeNull());
    expect(returnAction).toHaveBeenCalledOnce();
  });
});

it('shows no decision to who may not decide', () => {
  renderDecision({ may: { accept: false, return: false } });
  expect(screen.queryByRole('button')).toBeNull();
});

describe('commenting', () => {
  it('sends what the comment is about, and empties afterwards', async () => {
    const action = vi.fn(async (_before: unknown, _data: FormData | object) => ({
      ok: true as const,
      answer: { id: 'c1' },
    }));
    render(<CommentForm fitId="f1" groups={commentTargets(makeFit())} action={action} />);
    fireEvent.change(screen.getByLabelText('About'), { target: { value: 'point 14 keV' } });
    fireEvent.change(screen.getByLabelText('Comment'), { target: { value: 'Why so high?' } });
    fireEvent.click(screen.getByRole('button', { name: 'Comment' }));
    await waitFor(() => expect(screen.getByRole('status').textContent).toBe('Comment added.'));
    expect(sentFields(action.mock.calls[0]?.[1])).toEqual({
      id: 'f1',
      target: 'point 14 keV',
      body: 'Why so high?',
    });
    expect(screen.getByLabelText<HTMLTextAreaElement>('Comment').value).toBe('');
  });
});

describe('the queue', () => {
  it("marks one's own fit as someone else's to review", () => {
    const fit = makeFit();
    const now = new Date('2026-03-03T10:00:00Z');
    render(<ReviewQueue fits={[fit]} viewerId={fit.createdById} now={now} />);
    expect(screen.getByText('yours: someone else must review')).toBeTruthy();
    expect(screen.getByText('2 days')).toBeTruthy();
  });

  it('names the analyst of any other', () => {
    render(<ReviewQueue fits={[makeFit()]} viewerId="someone else" now={new Date()} />);
    expect(screen.getByText('Ana Lyst')).toBeTruthy();
  });
});

describe('where a fit stands', () => {
  it("says that one's own fit needs someone else", () => {
    render(<ReviewStanding fit={makeFit()} own />);
    expect(screen.getByText(/someone else must review it/)).toBeTruthy();
  });

  it('warns that the scan was edited since', () => {
    render(<ReviewStanding fit={makeFit({ scanChangedSince: true })} own={false} />);
    expect(screen.getByText(/The scan was edited after this fit was frozen/)).toBeTruthy();
  });

  it('leads from an accepted fit to its issued profile', () => {
    const id = '00000000-0000-4000-8000-000000000099';
    const fit = makeFit({ state: 'accepted', issuedProfileId: id, issuedNumber: 'SL-2026-001' });
    render(<ReviewStanding fit={fit} own={false} />);
    expect(screen.getByRole('link', { name: 'SL-2026-001' }).getAttribute('href')).toBe(
      `/profiles/${id}`,
    );
  });
});
