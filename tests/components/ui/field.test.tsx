import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { Field } from '@/components/ui/field';
import { Select } from '@/components/ui/select';
import { TextArea } from '@/components/ui/text-area';
import { TextInput } from '@/components/ui/text-input';

/** What describes a control to a screen reader, in order (WAI-ARIA 1.2, aria-describedby). */
function descriptionOf(control: HTMLElement): string[] {
  const ids = control.getAttribute('aria-describedby')?.split(' ') ?? [];
  return ids.map((id) => document.getElementById(id)?.textContent ?? `missing ${id}`);
}

describe('Field', () => {
  it('names its control and gives it the name of the form field', () => {
    render(
      <Field label="Thickness" unit="nm" name="capThicknessNm">
        <TextInput numeric defaultValue="25" />
      </Field>,
    );
    const input = screen.getByRole('textbox', { name: 'Thickness (nm)' });
    expect(input.getAttribute('name')).toBe('capThicknessNm');
    expect(input.getAttribute('inputmode')).toBe('decimal');
    expect(input.hasAttribute('aria-invalid')).toBe(false);
    expect(input.hasAttribute('aria-describedby')).toBe(false);
  });

  it.each([
    ['text input', <TextInput key="control" />],
    ['text area', <TextArea key="control" />],
    ['select', <Select key="control" options={[{ value: 'a', label: 'A' }]} />],
  ])('ties error and hint to a %s, the error first', (_what, control) => {
    render(
      <Field label="Doping" hint="Such as 1.1e16." error="Doping: expected a number above 0.">
        {control}
      </Field>,
    );
    const tied = screen.getByLabelText('Doping');
    expect(tied.getAttribute('aria-invalid')).toBe('true');
    expect(descriptionOf(tied)).toEqual(['Doping: expected a number above 0.', 'Such as 1.1e16.']);
  });

  it('marks what is required and what is optional', () => {
    render(
      <>
        <Field label="Name" required>
          <TextInput />
        </Field>
        <Field label="Notes" optional>
          <TextInput />
        </Field>
      </>,
    );
    expect(screen.getByLabelText('Name').getAttribute('aria-required')).toBe('true');
    expect(screen.getByLabelText('Notes, optional').hasAttribute('aria-required')).toBe(false);
  });
});
