import { fireEvent, render, screen, within } from '@testing-library/react';
import { describe, expect, it, vi } from 'vitest';

import { ChecksList } from '@/components/fit-desk/checks-list';
import { ComparisonPanel } from '@/components/fit-desk/comparison-panel';
import { AnswerHeadline } from '@/components/fit-desk/answer-headline';
import { DragHandle } from '@/components/fit-desk/drag-handle';
import { FitBar } from '@/components/fit-desk/fit-bar';
import { NOTHING_FITTED } from '@/components/fit-desk/fitting';
import { NumberField } from '@/components/fit-desk/number-field';
import { ParameterTable } from '@/components/fit-desk/parameter-table';
import { ScanPointTable } from '@/components/fit-desk/scan-point-table';
import type { FitParameter } from '@/lib/inversion/index';

import { residual } from '../charts/sample-data';
import { assumptions } from './desk-data';

const edge: FitParameter = {
  name: 'edgeDepthNm',
  value: 78.43,
  sigma: 2,
  interval68: [76.5, 80.5],
  interval95: [74, 83],
  held: false,
  atBound: null,
  symmetric: true,
};

describe('a handle', () => {
  function show() {
    const did = { onMove: vi.fn(), onDrop: vi.fn(), onClear: vi.fn() };
    render(
      <svg>
        <DragHandle
          label="Edge depth"
          value={78}
          valueText="78.0 nm"
          min={0}
          max={200}
          step={0.4}
          orientation="horizontal"
          valueAt={({ x }) => x}
          {...did}
        >
          <circle r={6} />
        </DragHandle>
      </svg>,
    );
    return { ...did, handle: screen.getByRole('slider', { name: 'Edge depth' }) };
  }

  it('moves by its step with the arrows, and tells when the key is let go', () => {
    const { handle, onMove, onDrop } = show();
    fireEvent.keyDown(handle, { key: 'ArrowLeft' });
    expect(onMove).toHaveBeenCalledWith(77.6);
    expect(onDrop).not.toHaveBeenCalled();
    fireEvent.keyUp(handle, { key: 'ArrowLeft' });
    expect(onDrop).toHaveBeenCalledOnce();
  });

  it('goes back to the fit with Escape and leaves other keys alone', () => {
    const { handle, onMove, onClear } = show();
    fireEvent.keyDown(handle, { key: 'Escape' });
    expect(onClear).toHaveBeenCalledOnce();
    fireEvent.keyDown(handle, { key: 'Enter' });
    fireEvent.keyDown(handle, { key: 'ArrowLeft', ctrlKey: true });
    expect(onMove).not.toHaveBeenCalled();
  });

  it('says its value with its unit', () => {
    expect(show().handle.getAttribute('aria-valuetext')).toBe('78.0 nm');
  });
});

describe('parameter table', () => {
  const edit = { hold: vi.fn(), change: vi.fn() };
  const show = (outOfDate = false) =>
    render(
      <ParameterTable
        assumptions={assumptions()}
        observable="fraction"
        answer={{ parameters: [edge] }}
        drawn={{}}
        outOfDate={outOfDate}
        edit={edit}
      />,
    );

  it('shows a value with its interval, and all digits on hover', () => {
    show();
    const row = screen.getByText('Edge depth').closest('li')!;
    expect(row.textContent).toContain('78.4');
    expect(within(row).getByTitle(/78\.43/)).toBeTruthy();
  });

  it('holds a parameter by its switch', () => {
    show();
    fireEvent.click(screen.getByRole('switch', { name: 'Hold Edge depth' }));
    expect(edit.hold).toHaveBeenCalledWith('edgeDepthNm', true);
  });

  it('opens the prior of a free parameter and the value of a held one', () => {
    show();
    fireEvent.click(screen.getByRole('button', { name: 'Edge depth' }));
    fireEvent.click(screen.getByRole('checkbox', { name: 'A prior is known' }));
    expect(edit.change).toHaveBeenCalledWith(
      'edgeDepthNm',
      { prior: { mean: 0, sigma: 0.1 } },
      'edgeDepthNm prior',
    );
    fireEvent.click(screen.getByRole('button', { name: 'Depth scale' }));
    fireEvent.change(screen.getByLabelText('Held at'), { target: { value: '1,02' } });
    expect(edit.change).toHaveBeenCalledWith('depthScale', { value: 1.02 }, 'depthScale value');
  });
});

describe('number field', () => {
  it('keeps what cannot be read as typed, with its reason, and takes nothing', () => {
    const onChange = vi.fn();
    render(
      <NumberField label="Thickness" unit="nm" value={4} range={{ min: 0 }} onChange={onChange} />,
    );
    const input = screen.getByRole('textbox');
    fireEvent.change(input, { target: { value: '-' } });
    expect(onChange).not.toHaveBeenCalled();
    expect((input as HTMLInputElement).value).toBe('-');
    expect(input.getAttribute('aria-invalid')).toBe('true');
    expect(screen.getByText('Thickness: expected a number such as 78.4 or 6.2e15.')).toBeTruthy();
  });

  it('shows the old number after an undo, not the draft', () => {
    const { rerender } = render(
      <NumberField label="Thickness" value={4} range={{}} onChange={() => {}} />,
    );
    fireEvent.change(screen.getByRole('textbox'), { target: { value: '42' } });
    rerender(<NumberField label="Thickness" value={42} range={{}} onChange={() => {}} />);
    rerender(<NumberField label="Thickness" value={4} range={{}} onChange={() => {}} />);
    expect((screen.getByRole('textbox') as HTMLInputElement).value).toBe('4');
  });
});

describe('the one number', () => {
  it('stands with its interval', () => {
    const { container } = render(
      <AnswerHeadline
        edge={{ ...edge, interval68: [76.5, 80.6] }}
        width={null}
        polarity="depletion"
        outOfDate={false}
      />,
    );
    expect(container.textContent).toContain('78.4+2.2−1.9nm');
    expect(container.textContent).toContain('depletion ends, 68 % interval');
  });

  it('is said one-sided where it is', () => {
    const open: FitParameter = {
      ...edge,
      value: 130,
      interval68: [118, null],
      interval95: [112, null],
      sigma: null,
    };
    render(<AnswerHeadline edge={open} width={null} polarity="depletion" outOfDate={false} />);
    expect(screen.getByText('deeper than 112 nm (95 %)')).toBeTruthy();
  });

  it('says when it is out of date', () => {
    render(<AnswerHeadline edge={edge} width={null} polarity="accumulation" outOfDate />);
    expect(screen.getByText('accumulation ends, 68 % interval, out of date')).toBeTruthy();
  });
});

describe('checks in words', () => {
  it('puts what needs attention first and folds the rest away behind their number', () => {
    const fine = ['a', 'b', 'c', 'd'].map((id) => ({
      id,
      state: 'fine' as const,
      message: `Fine ${id}.`,
    }));
    render(
      <ChecksList
        checks={[
          ...fine,
          { id: 'x', state: 'caution', message: 'Look here.' },
          { id: 'y', state: 'problem', message: 'This is wrong.' },
        ]}
        outOfDate={false}
      />,
    );
    const items = screen.getAllByRole('listitem').map((item) => item.textContent);
    expect(items.slice(0, 3)).toEqual([
      'Problem: This is wrong.',
      'Caution: Look here.',
      'Fine: Fine a.',
    ]);
    expect(screen.getByText('3 more are fine')).toBeTruthy();
  });
});

describe('the bar that fits', () => {
  const show = (change: Partial<Parameters<typeof FitBar>[0]> = {}) =>
    render(
      <FitBar
        fit={{ ...NOTHING_FITTED, stop: vi.fn() }}
        outOfDate={false}
        obstacle={null}
        ready
        loading={false}
        comparing={false}
        onCompare={vi.fn()}
        {...change}
      />,
    );

  it('shows progress with elapsed time, and stops', () => {
    const stop = vi.fn();
    show({
      fit: {
        ...NOTHING_FITTED,
        run: 1,
        progress: { done: 1420, total: 2000, elapsedMs: 830 },
        stop,
      },
    });
    expect(screen.getByRole('status').textContent).toBe('Resampling 1,420 of 2,000, 0.8 s');
    expect(screen.getByRole('progressbar').getAttribute('value')).toBe('1420');
    fireEvent.click(screen.getByRole('button', { name: 'Stop' }));
    expect(stop).toHaveBeenCalledOnce();
  });

  it('says why a fit cannot start, in the words of the inversion', () => {
    show({
      ready: false,
      obstacle:
        'The fit has 4 free parameters but only 2 points in use; hold parameters or add points.',
    });
    expect(screen.getByText(/only 2 points in use/)).toBeTruthy();
    expect((screen.getByRole('button', { name: 'Fit' }) as HTMLButtonElement).disabled).toBe(true);
  });
});

describe('points behind the scan', () => {
  const points = [
    { energyKeV: 2, value: 0.7, sigma: 0.01, enabled: true },
    { energyKeV: 6, value: 0.6, sigma: 0.01, enabled: false },
  ];

  it('switch by their box, except those that are off in the scan', () => {
    const onToggle = vi.fn();
    render(
      <ScanPointTable
        points={points}
        residuals={[residual(2)]}
        offInScan={new Set([6])}
        onToggle={onToggle}
      />,
    );
    fireEvent.click(screen.getByRole('checkbox', { name: '2 keV in use' }));
    expect(onToggle).toHaveBeenCalledWith(2);
    expect(
      (screen.getByRole('checkbox', { name: '6 keV in use' }) as HTMLInputElement).disabled,
    ).toBe(true);
  });
});

describe('model comparison', () => {
  it('says what it is for before it was asked for, and that it is out of date after a change', () => {
    const { rerender } = render(
      <ComparisonPanel
        result={null}
        busy={false}
        error={null}
        outOfDate={false}
        current="graded"
      />,
    );
    expect(screen.getByText(/Compare all fits every trial profile/)).toBeTruthy();
    rerender(
      <ComparisonPanel
        result={{
          key: 'k',
          fits: [],
          refusals: [{ kind: 'graded', message: 'Too few points.' }],
        }}
        busy={false}
        error={null}
        outOfDate
        current="graded"
      />,
    );
    expect(screen.getByText(/Something changed since: compare again/)).toBeTruthy();
    expect(screen.getByText(/Too few points/)).toBeTruthy();
  });
});
