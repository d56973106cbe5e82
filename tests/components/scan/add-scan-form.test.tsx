import { configure, fireEvent, render, screen, waitFor, within } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';

import { AddScanForm } from '@/components/scan/add-scan-form';

// Several checks may share two cores; waiting longer hides nothing.
configure({ asyncUtilTimeout: 15_000 });

const push = vi.hoisted(() => vi.fn());
vi.mock('next/navigation', () => ({ useRouter: () => ({ push }) }));

const SAMPLE = { id: '7d1f5b0e-58c3-4f0a-9a8e-6f0f4c0a1b2c', name: 'NB-34, as oxidised' };
const CLEAN = 'energy_keV;fraction;sigma\n2;0,742;0,004\n4;0,731;0,004\n6;0,690;0,005\n';
const BROKEN = 'energy_keV,fraction,sigma\n2,0.742,0.004\n4,abc,0.004\n6,0.690,0.004\n';

const requests: { path: string; body: FormData }[] = [];
let answer: () => Response;

beforeEach(() => {
  // jsdom has no layout and so no ResizeObserver; nothing is drawn then, and the form does not need it.
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe() {}
      disconnect() {}
    },
  );
  vi.stubGlobal('fetch', (path: string, { body }: { body: FormData }) => {
    requests.push({ path, body });
    return Promise.resolve(answer());
  });
  answer = () => Response.json({ id: 'new-scan' }, { status: 201 });
});
afterEach(() => {
  requests.length = 0;
  push.mockClear();
  vi.unstubAllGlobals();
});

const show = () => render(<AddScanForm samples={[SAMPLE]} sampleId={SAMPLE.id} />);
const save = () => screen.getByRole<HTMLButtonElement>('button', { name: 'Save scan' });
const reasonOf = (button: HTMLElement) =>
  document.getElementById(button.getAttribute('aria-describedby') ?? '')?.textContent;

async function choose(text: string, name = 'scan.csv') {
  const input = screen.getByLabelText(/Drop a scan file|Another file/);
  fireEvent.change(input, { target: { files: [new File([text], name, { type: 'text/csv' })] } });
  await screen.findByText(name);
}

describe('adding a scan from a file', () => {
  it('keeps Save disabled with the reason until there is a file', () => {
    show();
    expect(save().disabled).toBe(true);
    expect(reasonOf(save())).toBe('Choose a file first.');
  });

  it('shows what was recognised and sends file and reading together', async () => {
    show();
    await choose(CLEAN);
    expect((await screen.findByLabelText<HTMLSelectElement>('Between cells')).value).toBe(
      'semicolon',
    );
    expect(screen.getByLabelText<HTMLSelectElement>('Decimal mark').value).toBe('comma');
    expect(save().disabled).toBe(false);
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: '260 K, dark' } });
    fireEvent.click(save());
    await waitFor(() => expect(push).toHaveBeenCalledWith('/scans/new-scan'));
    const sent = requests[0]?.body;
    const details = JSON.parse(String(sent?.get('details'))) as Record<string, unknown>;
    expect(details).toMatchObject({
      sampleId: SAMPLE.id,
      meta: { name: '260 K, dark' },
      reading: { delimiter: 'semicolon', decimal: 'comma' },
    });
    const file = sent?.get('file');
    expect(file instanceof File && file.size).toBe(CLEAN.length);
  });

  it('names a bad row with its line and saves once the line is left out by name', async () => {
    show();
    await choose(BROKEN);
    const problems = await screen.findByRole('region', { name: 'Lines to mend' });
    expect(problems.textContent).toContain('scan.csv, line 3, column 2');
    expect(save().disabled).toBe(true);
    expect(reasonOf(save())).toBe('One line needs mending or leaving out.');
    fireEvent.click(within(problems).getByRole('button', { name: 'Leave out line 3' }));
    await waitFor(() => expect(save().disabled).toBe(false));
    expect(screen.queryByRole('region', { name: 'Lines to mend' })).toBeNull();
    fireEvent.click(screen.getByRole('button', { name: 'Take line 3 back' }));
    await waitFor(() => expect(save().disabled).toBe(true));
  });

  it('reads again when the decimal mark is corrected', async () => {
    show();
    await choose(CLEAN);
    fireEvent.change(await screen.findByLabelText('Decimal mark'), { target: { value: 'point' } });
    const problems = await screen.findByRole('region', { name: 'Lines to mend' });
    expect(problems.textContent).toContain('line 2');
    await waitFor(() => expect(reasonOf(save())).toBe('3 lines need mending or leaving out.'));
  });

  it('says why a file is no table and keeps what was typed', async () => {
    show();
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: 'dark' } });
    await choose('\u0000\u0001\u0002 binary', 'renamed.csv');
    const alert = await screen.findByText(/renamed\.csv: the file is binary/);
    expect(alert).toBeDefined();
    expect(reasonOf(save())).toBe('The file cannot be read as a table.');
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('dark');
  });

  it('refuses a file over the limit before it is read', async () => {
    show();
    const input = screen.getByLabelText(/Drop a scan file/);
    const large = new File([new Uint8Array(6 * 1024 * 1024)], 'large.csv');
    fireEvent.change(input, { target: { files: [large] } });
    expect(
      await screen.findByText(/large\.csv has 6\.0 MB; expected at most 5\.0 MB/),
    ).toBeDefined();
    expect(save().disabled).toBe(true);
  });

  it('shows a refusal of the server and loses nothing', async () => {
    answer = () =>
      Response.json(
        {
          error: {
            code: 'invalid',
            message: 'Name: this sample has one of that name.',
            fields: { 'meta.name': 'Taken.' },
          },
        },
        { status: 422 },
      );
    show();
    await choose(CLEAN);
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: 'dark' } });
    await waitFor(() => expect(save().disabled).toBe(false));
    fireEvent.click(save());
    expect(await screen.findByText(/this sample has one of that name/)).toBeDefined();
    expect(screen.getByText('Taken.')).toBeDefined();
    expect(screen.getByText('scan.csv')).toBeDefined();
    expect(save().disabled).toBe(false);
    expect(push).not.toHaveBeenCalled();
  });

  it('asks for a name before anything is sent', async () => {
    show();
    await choose(CLEAN);
    await waitFor(() => expect(save().disabled).toBe(false));
    fireEvent.click(save());
    expect(await screen.findAllByText(/Name: write something here/)).toHaveLength(2);
    expect(requests).toHaveLength(0);
  });
});

describe('light', () => {
  it('shows the caution for lamps and lasers as soon as a scan is not dark', () => {
    show();
    expect(screen.queryByText(/laser-safety rules/)).toBeNull();
    fireEvent.change(screen.getByLabelText('Illumination'), { target: { value: 'illuminated' } });
    expect(screen.getByText(/laser-safety rules/)).toBeDefined();
  });
});

describe('typing a scan', () => {
  it('sends typed points as JSON and is blocked by a bad cell', async () => {
    show();
    fireEvent.click(screen.getByRole('tab', { name: 'Type' }));
    expect(reasonOf(save())).toBe('Type or paste at least one point.');
    const first = screen.getByRole('textbox', { name: 'energy, row 1' });
    fireEvent.paste(first, { clipboardData: { getData: () => '2\t0,7\t0,01\n4\t0,6\t0' } });
    expect(reasonOf(save())).toBe('One cell needs mending.');
    fireEvent.change(screen.getByRole('textbox', { name: 'σ, row 2' }), {
      target: { value: '0.02' },
    });
    expect(save().disabled).toBe(false);
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: 'typed' } });
    fireEvent.click(save());
    await waitFor(() => expect(push).toHaveBeenCalledWith('/scans/new-scan'));
    const body = JSON.parse(String(requests[0]?.body)) as { source: { points: unknown } };
    expect(body.source.points).toEqual([
      { energyKeV: 2, value: 0.7, sigma: 0.01, enabled: true, note: '' },
      { energyKeV: 4, value: 0.6, sigma: 0.02, enabled: true, note: '' },
    ]);
  });
});

describe('pasting text', () => {
  it('asks to read a text again after it was changed', async () => {
    show();
    fireEvent.click(screen.getByRole('tab', { name: 'Paste text' }));
    const box = screen.getByLabelText('Table as text');
    fireEvent.change(box, { target: { value: '2 0.7 0.01\n4 0.6 0.01' } });
    fireEvent.click(screen.getByRole('button', { name: 'Read the text' }));
    await waitFor(() => expect(save().disabled).toBe(false));
    fireEvent.change(box, { target: { value: '2 0.7 0.01\n4 0.5 0.01' } });
    expect(reasonOf(save())).toBe('Read the changed text first.');
  });
});
