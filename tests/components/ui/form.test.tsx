import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormState } from '@/components/ui/form-state';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextInput } from '@/components/ui/text-input';

type Sent = Record<string, unknown>;

function show(answer: (sent: Sent) => Promise<FormState<string>>) {
  const sent: Sent[] = [];
  const onDone = vi.fn();
  render(
    <Form
      label="Add a sample"
      onDone={onDone}
      action={async (_previous, data) => {
        const fields = data instanceof FormData ? Object.fromEntries(data) : { ...data };
        sent.push(fields);
        return answer(fields);
      }}
    >
      <Field label="Name" name="name">
        <TextInput />
      </Field>
      <Field label="Doping" name="doping">
        <TextInput numeric />
      </Field>
      <SubmitButton pendingLabel="Saving …">Add</SubmitButton>
    </Form>,
  );
  return { sent, onDone };
}

const type = (label: string, value: string) =>
  fireEvent.change(screen.getByLabelText(label), { target: { value } });
const submit = () => fireEvent.submit(screen.getByRole('form', { name: 'Add a sample' }));

describe('Form', () => {
  it('sends its fields and hands the answer on, once', async () => {
    const { sent, onDone } = show(async () => ({ ok: true, answer: 'sample-1' }));
    type('Name', 'NB-34');
    type('Doping', '1.1e16');
    submit();
    await waitFor(() => expect(onDone).toHaveBeenCalledExactlyOnceWith('sample-1'));
    expect(sent).toEqual([{ name: 'NB-34', doping: '1.1e16' }]);
  });

  it('keeps what was typed when the server cannot be reached, and says so', async () => {
    // What a browser's fetch rejects with, by the Fetch standard.
    const { onDone } = show(() => Promise.reject(new TypeError('Failed to fetch')));
    type('Name', 'NB-34');
    submit();
    expect((await screen.findByRole('alert')).textContent).toContain('could not be reached');
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('NB-34');
    expect(onDone).not.toHaveBeenCalled();
  });

  it('keeps what was typed when refused, and puts the focus on the first wrong field', async () => {
    const refusal = {
      ok: false as const,
      message: 'Doping: expected a number.',
      fields: { doping: 'Doping: expected a number.' },
    };
    const { onDone } = show(async () => refusal);
    type('Name', 'NB-34');
    type('Doping', 'many');
    submit();
    expect((await screen.findByRole('alert')).textContent).toContain('Doping: expected a number.');
    const doping = screen.getByLabelText<HTMLInputElement>('Doping');
    expect(doping.value).toBe('many');
    expect(screen.getByLabelText<HTMLInputElement>('Name').value).toBe('NB-34');
    expect(doping.getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByLabelText('Name').hasAttribute('aria-invalid')).toBe(false);
    await waitFor(() => expect(document.activeElement).toBe(doping));
    expect(onDone).not.toHaveBeenCalled();
  });

  it('puts the focus on the refusal itself when no field is to blame', async () => {
    show(async () => ({ ok: false, message: 'Too many tries. Wait a minute.', fields: {} }));
    submit();
    await waitFor(() => expect(document.activeElement).toBe(screen.getByRole('alert')));
  });

  it('says that it is under way, and sends only once', async () => {
    let finish: (state: FormState<string>) => void = () => {};
    const { sent } = show(() => new Promise((resolve) => (finish = resolve)));
    submit();
    const button = await screen.findByRole('button', { name: 'Saving …' });
    expect(button.getAttribute('aria-busy')).toBe('true');
    submit();
    finish({ ok: true });
    await screen.findByRole('button', { name: 'Add' });
    expect(sent).toHaveLength(1);
  });
});
