import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { SampleForm } from '@/components/sample/sample-form';
import type { FormState } from '@/components/ui/form-state';
import { sampleInputSchema, type Sample } from '@/lib/schemas/sample';

const SAMPLE: Sample = {
  id: '9f1c3c1e-7d0c-4f43-8a57-0d3c2a9f8b11',
  name: 'NB-34 annealed',
  material: 'n-type 4H-SiC',
  carrier: 'electrons',
  dopingPerCm3: 1.1e16,
  dopingSigmaPerCm3: null,
  capMaterial: 'thermal oxide',
  capThicknessNm: 25,
  treatment: '',
  notes: '',
  invented: true,
  archivedAt: null,
  createdAt: '2026-02-03T10:00:00.000Z',
  createdBy: 'Ines Kaltofen',
};

async function sentBy(sample?: Sample): Promise<Record<string, unknown>> {
  const action = vi.fn(
    async (
      _previous: FormState<{ id: string }>,
      _data: FormData | object,
    ): Promise<FormState<{ id: string }>> => null,
  );
  render(<SampleForm action={action} sample={sample} cancelHref="/samples" />);
  if (!sample) {
    fireEvent.change(screen.getByLabelText('Name'), { target: { value: 'HX-204' } });
    fireEvent.change(screen.getByLabelText('Material'), { target: { value: 'germanium' } });
  }
  fireEvent.submit(screen.getByRole('form'));
  await waitFor(() => expect(action).toHaveBeenCalledOnce());
  const data = action.mock.calls[0]?.[1];
  return data instanceof FormData ? Object.fromEntries(data) : {};
}

describe('SampleForm', () => {
  it('sends what the schema takes, and a blank number is not known, never zero', async () => {
    const sent = await sentBy();
    expect(sampleInputSchema.parse(sent)).toMatchObject({
      name: 'HX-204',
      material: 'germanium',
      dopingPerCm3: null,
      capThicknessNm: null,
    });
  });

  it('sends a sample back unchanged when nothing was edited', async () => {
    const { id, ...sent } = await sentBy(SAMPLE);
    expect(id).toBe(SAMPLE.id);
    const kept = sampleInputSchema.parse(sent);
    expect(SAMPLE).toMatchObject(kept);
  });
});
