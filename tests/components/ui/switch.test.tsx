import { fireEvent, render, screen } from '@testing-library/react';
import { useState } from 'react';
import { describe, expect, it } from 'vitest';

import { Switch } from '@/components/ui/switch';

function Held() {
  const [held, setHeld] = useState(false);
  return (
    <Switch
      label="Hold the edge depth"
      labelHidden
      checked={held}
      onChange={(event) => setHeld(event.target.checked)}
    />
  );
}

describe('Switch', () => {
  it('is a switch with a name, and turns on and off', () => {
    render(<Held />);
    const toggle = screen.getByRole<HTMLInputElement>('switch', { name: 'Hold the edge depth' });
    expect(toggle.checked).toBe(false);
    fireEvent.click(toggle);
    expect(toggle.checked).toBe(true);
    fireEvent.click(toggle);
    expect(toggle.checked).toBe(false);
  });
});
