import { fireEvent, render, screen, waitFor } from '@testing-library/react';
import { afterEach, describe, expect, it, vi } from 'vitest';

import { svgDocument } from '@/components/charts/export-svg';
import { Figure } from '@/components/charts/figure';

/** jsdom measures nothing: the frame is said to be 500 px wide. */
class Measure {
  constructor(private readonly tell: (entries: { contentRect: { width: number } }[]) => void) {}
  observe() {
    this.tell([{ contentRect: { width: 500.7 } }]);
  }
  disconnect() {}
}

afterEach(() => vi.unstubAllGlobals());

function show() {
  vi.stubGlobal('ResizeObserver', Measure);
  return render(
    <Figure
      title="Energy scan"
      table={{ columns: ['energy (keV)'], rows: [[2]] }}
      svgName="scan"
      height={120}
    >
      {(width) => <svg role="img" aria-label="picture" width={width} height={120} />}
    </Figure>,
  );
}

describe('figure', () => {
  it('draws at the measured width in whole pixels', async () => {
    show();
    expect((await screen.findByRole('img', { name: 'picture' })).getAttribute('width')).toBe('500');
  });

  it('opens the table behind the picture', () => {
    show();
    const tool = screen.getByRole('button', { name: 'table' });
    expect(tool.getAttribute('aria-expanded')).toBe('false');
    fireEvent.click(tool);
    expect(screen.getByRole('columnheader', { name: 'energy (keV)' })).toBeTruthy();
    expect(tool.getAttribute('aria-expanded')).toBe('true');
  });

  it('copies the data and says so', async () => {
    const writeText = vi.fn(() => Promise.resolve());
    vi.stubGlobal('navigator', { ...navigator, clipboard: { writeText } });
    show();
    fireEvent.click(screen.getByRole('button', { name: 'copy data' }));
    await waitFor(() => expect(screen.getByRole('status').textContent).toBe('Data copied.'));
    expect(writeText).toHaveBeenCalledWith('energy (keV)\n2\n');
  });

  it('says in words when the clipboard refuses', async () => {
    vi.stubGlobal('navigator', {
      ...navigator,
      clipboard: { writeText: () => Promise.reject(new Error('not allowed')) },
    });
    show();
    fireEvent.click(screen.getByRole('button', { name: 'copy data' }));
    await waitFor(() =>
      expect(screen.getByRole('status').textContent).toBe(
        'That did not work: not allowed. Nothing was changed.',
      ),
    );
  });
});

describe('svg document', () => {
  it('stands alone: a name, a background, no classes, and nothing that is only for the page', () => {
    const { container } = render(
      <svg width={10} height={10} className="block" role="img">
        <text className="figures" x={1} y={1}>
          2 &lt; 3
        </text>
        <circle data-export="no" r={3} />
      </svg>,
    );
    const text = svgDocument(container.querySelector('svg')!, 'Energy scan');
    const parsed = new DOMParser().parseFromString(text, 'image/svg+xml');
    expect(parsed.querySelector('parsererror')).toBeNull();
    expect(parsed.querySelector('title')?.textContent).toBe('Energy scan');
    expect(parsed.querySelector('circle')).toBeNull();
    expect(parsed.querySelector('rect')?.getAttribute('width')).toBe('10');
    expect(text).not.toMatch(/class=|var\(/);
    expect(parsed.querySelector('text')?.textContent).toContain('2 < 3');
  });
});
