import { configure, fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { AddStoppingForm } from '@/components/stopping/add-stopping-form';

// Several checks may share two cores; waiting longer hides nothing.
configure({ asyncUtilTimeout: 15_000 });

const push = vi.hoisted(() => vi.fn());
vi.mock('next/navigation', () => ({ useRouter: () => ({ push }) }));

const ONE = 'depth_nm counts\n5 40\n15 30\n25 10\n';
const requests: FormData[] = [];

beforeEach(() => {
  // jsdom has no layout and so no ResizeObserver; nothing is drawn then, and the form does not need it.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      disconnect() {}
    },
  );
  vi.stubGlobal('fetch', (_path: string, { body }: { body: FormData }) => {
    requests.push(body);
    return Promise.resolve(Response.json({ id: 'new-set' }, { status: 201 }));
  });
});
afterEach(() => {
  requests.length = 0;
  vi.unstubAllGlobals();
});

const save = () => screen.getByRole<HTMLButtonElement>('button', { name: 'Save stopping set' });

async function choose(files: Record<string, string>) {
  const input = screen.getByLabelText(/Drop stopping profiles|Add or replace/);
  fireEvent.change(input, {
    target: { files: Object.entries(files).map(([name, text]) => new File([text], name)) },
  });
  await screen.findByText(Object.keys(files)[0] ?? '');
}

describe('adding a stopping set', () => {
  it('takes many files, asks for the energy that none names, and sends all of them in order', async () => {
    render(<AddStoppingForm />);
    expect(save().disabled).toBe(true);
    await choose({ '2keV.txt': ONE, 'second.txt': ONE });
    expect(await screen.findByText(/type it in\./)).toBeDefined();
    expect(save().disabled).toBe(true);
    fireEvent.change(screen.getByLabelText(/Energy of second\.txt/), { target: { value: '8' } });
    await waitFor(() => expect(save().disabled).toBe(false));
    expect(screen.getByRole('region', { name: 'Moments' })).toBeDefined();
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: 'SiC, 1 nm bins' } });
    fireEvent.change(screen.getByLabelText('Layer stack'), {
      target: { value: '25 nm SiO₂ on 4H-SiC' },
    });
    fireEvent.click(save());
    await waitFor(() => expect(push).toHaveBeenCalledWith('/stopping/new-set'));
    const names = requests[0]
      ?.getAll('file')
      .map((file) => (file instanceof File ? file.name : ''));
    expect(names).toEqual(['2keV.txt', 'second.txt']);
    const details = JSON.parse(String(requests[0]?.get('details'))) as {
      reading: { files: { energyKeV: number | null }[] };
    };
    expect(details.reading.files.map(({ energyKeV }) => energyKeV)).toEqual([null, 8]);
  });

  it('names a bad line, leaves it out by name and takes it back', async () => {
    render(<AddStoppingForm />);
    await choose({ '2keV.txt': 'depth_nm counts\n5 40\n15 -30\n25 10\n35 1\n' });
    const leave = await screen.findByRole('button', { name: 'Leave out line 3' });
    fireEvent.click(leave);
    await waitFor(() => expect(save().disabled).toBe(false));
    fireEvent.click(screen.getByRole('button', { name: 'Take line 3 back' }));
    await waitFor(() => expect(save().disabled).toBe(true));
  });

  it('warns when more than 2 % of the muons did not stop', async () => {
    render(<AddStoppingForm />);
    await choose({ '2keV.txt': ONE });
    fireEvent.change(await screen.findByLabelText(/Muons implanted/), { target: { value: '100' } });
    expect(await screen.findByText(/At 2 keV 20 % of the muons did not stop/)).toBeDefined();
    fireEvent.change(screen.getByLabelText(/Muons implanted/), { target: { value: '81' } });
    await waitFor(() => expect(screen.queryByText(/did not stop/, { selector: 'div' })).toBeNull());
  });
});
