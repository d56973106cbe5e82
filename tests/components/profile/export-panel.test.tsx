import { cleanup, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { ExportPanel } from '@/components/profile/export-panel';

import { makeFit } from '../review/make-fit';

const refresh = vi.fn();
const saveAs = vi.fn();
vi.mock('next/navigation', () => ({ useRouter: () => ({ refresh }) }));
vi.mock('@/components/charts/save-as', () => ({
  saveAs: (...args: unknown[]) => saveAs(...args),
}));

const ID = '00000000-0000-4000-8000-000000000001';
const choice = { grid: 'fit', step: '1', depthUnit: 'nm', concentrationUnit: 'cm-3' } as const;

function renderPanel(unit: 'cm⁻³' | 'populated share' = 'cm⁻³') {
  const { carrierProfile } = makeFit();
  render(
    <ExportPanel
      profileId={ID}
      number="SL-2026-001"
      profile={{ ...carrierProfile, unit }}
      initial={choice}
      maxRows={1000}
    />,
  );
}
const link = () => screen.getByRole('link', { name: 'Download the CSV' });

beforeEach(() => history.replaceState(null, '', '/'));
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  refresh.mockReset();
  saveAs.mockReset();
});

describe('choosing', () => {
  it('keeps link, preview, row count and address in step with the choice', () => {
    renderPanel();
    expect(screen.getByText(/^5 rows/)).toBeTruthy();
    fireEvent.change(screen.getByLabelText('Grid'), { target: { value: 'uniform' } });
    fireEvent.change(screen.getByLabelText(/^Step/), { target: { value: '40' } });
    fireEvent.change(screen.getByLabelText('Depth in'), { target: { value: 'um' } });
    expect(link().getAttribute('href')).toBe(
      `/api/profiles/${ID}/export?grid=uniform&depthUnit=um&concentrationUnit=cm-3&stepNm=40`,
    );
    expect(screen.getByLabelText('First lines of the file').textContent).toMatch(/^depth_um,/);
    expect(screen.getByText(/^5 rows.*interpolated/)).toBeTruthy();
    expect(location.search).toBe('?grid=uniform&depthUnit=um&concentrationUnit=cm-3&stepNm=40');
  });

  it('takes the link away while the step makes no sense, and says why', () => {
    renderPanel();
    fireEvent.change(screen.getByLabelText('Grid'), { target: { value: 'uniform' } });
    fireEvent.change(screen.getByLabelText(/^Step/), { target: { value: '0.01' } });
    expect(screen.getByText(/makes 16,001 rows; at most 1,000/)).toBeTruthy();
    expect(link().getAttribute('aria-disabled')).toBe('true');
    expect(link().hasAttribute('href')).toBe(false);
  });

  it('offers no unit for a populated share', () => {
    renderPanel('populated share');
    expect(screen.getByLabelText<HTMLSelectElement>('Concentration in').disabled).toBe(true);
    expect(screen.getByLabelText('First lines of the file').textContent).toContain(
      'populated_share',
    );
  });
});

describe('downloading', () => {
  it('saves the file and shows it in the history', async () => {
    const csv = new Response('# issued profile: SL-2026-001\r\n');
    vi.stubGlobal(
      'fetch',
      vi.fn(async () => csv),
    );
    renderPanel();
    fireEvent.click(link());
    await waitFor(() => expect(saveAs).toHaveBeenCalledOnce());
    expect(saveAs.mock.calls[0]?.[0]).toBe('SL-2026-001.csv');
    expect(refresh).toHaveBeenCalledOnce();
  });

  it("shows the server's own sentence when it refuses", async () => {
    const refusal = { error: { code: 'forbidden', message: 'Your role does not allow exports.' } };
    vi.stubGlobal(
      'fetch',
      vi.fn(async () => Response.json(refusal, { status: 403 })),
    );
    renderPanel();
    fireEvent.click(link());
    expect((await screen.findByRole('alert')).textContent).toContain(
      'Your role does not allow exports.',
    );
    expect(saveAs).not.toHaveBeenCalled();
  });

  it('says so when something else than the product answers', async () => {
    vi.stubGlobal(
      'fetch',
      vi.fn(async () => new Response('<html>', { status: 502 })),
    );
    renderPanel();
    fireEvent.click(link());
    expect((await screen.findByRole('alert')).textContent).toContain('The server answered 502.');
  });
});
