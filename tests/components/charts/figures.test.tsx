import { render, screen } from '@testing-library/react';
import { describe, expect, it } from 'vitest';

import { CarrierProfileChart } from '@/components/charts/carrier-profile-chart';
import { DepthFigure } from '@/components/charts/depth-figure';
import { EvidenceTable } from '@/components/charts/evidence-table';
import { ResidualChart } from '@/components/charts/residual-chart';
import { ScanChart } from '@/components/charts/scan-chart';
import { StoppingRidgeline } from '@/components/charts/stopping-ridgeline';

import { residual, ridge, sharpProfile } from './sample-data';

const residuals = [2, 6, 10].map((energy) => residual(energy));

/** No number that could not be drawn, no text too small to read. */
function expectSound(svg: Element): void {
  expect(svg.outerHTML).not.toMatch(/NaN|Infinity|undefined/);
  const sizes = [...svg.querySelectorAll('[font-size]')].map((text) =>
    Number(text.getAttribute('font-size')),
  );
  expect(sizes.length).toBeGreaterThan(0);
  expect(Math.min(...sizes)).toBeGreaterThanOrEqual(11);
}

describe('depth figure', () => {
  const figure = (
    <DepthFigure
      ridges={[2, 6, 10].map(ridge)}
      profiles={[
        { label: 'sharp', style: 'solid', profile: sharpProfile() },
        { label: 'graded', style: 'dashed', profile: sharpProfile() },
      ]}
      information={{ depthsNm: [0, 50, 100], values: [0.2, 1, 0.1] }}
      edgeNm={80}
      edgeLabel="edge 80.0 nm"
      edgeInterval={[78, null]}
      carrier="holes"
      capThicknessNm={25}
      maxDepthNm={200}
      description="Three panels over one depth axis."
      width={640}
      height={560}
    />
  );

  it('is a picture with a sentence, and sound although the profile holds zeros', () => {
    render(figure);
    expectSound(screen.getByRole('img', { name: 'Three panels over one depth axis.' }));
  });

  it('hatches beyond reach and below the floor, and says so', () => {
    render(figure);
    expect(screen.getByText('beyond reach')).toBeTruthy();
    expect(screen.getByText('below the floor')).toBeTruthy();
    expect(screen.getByText('holes (cm⁻³)')).toBeTruthy();
    expect(screen.getByText('depth below the semiconductor surface (nm)')).toBeTruthy();
  });

  it('draws the fit solid and the compared model dashed', () => {
    const { container } = render(figure);
    const lines = [
      ...container.querySelectorAll('path[stroke="var(--coral)"], path[stroke="var(--tide)"]'),
    ];
    const dashes = lines.map((path) => [
      path.getAttribute('stroke'),
      path.getAttribute('stroke-dasharray'),
    ]);
    expect(dashes).toEqual([
      ['var(--tide)', '5 4'],
      ['var(--coral)', null],
    ]);
  });
});

describe('carrier profile chart', () => {
  it('shows a populated share on an axis from 0 to 1', () => {
    const share = sharpProfile();
    const points = share.points.map((point) => ({
      ...point,
      value: point.value > 0 ? 1 : 0,
      lower68: 0,
      upper68: 1,
      lower95: 0,
      upper95: 1,
    }));
    render(
      <CarrierProfileChart
        profiles={[
          {
            label: 'sharp',
            style: 'solid',
            profile: { ...share, unit: 'populated share', points, floor: 0.02 },
          },
        ]}
        carrier="electrons"
        width={500}
        height={300}
      />,
    );
    expect(screen.getByText('electrons (populated share)')).toBeTruthy();
    expect(screen.getByText('0.50')).toBeTruthy();
    expectSound(screen.getByRole('img'));
  });

  it('draws the scale error of the capture coefficient apart from the bands', () => {
    render(
      <CarrierProfileChart
        profiles={[{ label: 'sharp', style: 'solid', profile: sharpProfile() }]}
        carrier="holes"
        scaleError={0.2}
        width={500}
        height={300}
      />,
    );
    expect(screen.getByText(/±20 %: moves the whole profile, not in the bands/)).toBeTruthy();
  });
});

describe('scan chart', () => {
  it('draws points in use filled, switched-off points hollow, and marks interpolated energies', () => {
    const marks = [
      residual(2),
      residual(6, { enabled: false }),
      residual(10, { interpolated: true }),
    ];
    const { container } = render(
      <ScanChart residuals={marks} curves={[]} observable="fraction" width={400} height={300} />,
    );
    const fills = [...container.querySelectorAll('circle')].map((circle) =>
      circle.getAttribute('fill'),
    );
    expect(fills.map((fill) => fill === 'var(--paper)')).toEqual([false, true, false]);
    expect(
      screen.getAllByText('stopping profile interpolated between its neighbours'),
    ).toHaveLength(1);
    expect(
      screen.getByRole('img', {
        name: 'Energy scan of the diamagnetic fraction: 3 points from 2 to 10 keV, 1 switched off.',
      }),
    ).toBeTruthy();
    expectSound(screen.getByRole('img'));
  });

  it('does not let a drawn curve move the scale', () => {
    const curve = {
      label: 'fit',
      style: 'solid' as const,
      energiesKeV: [2, 10],
      values: [0.76, 0.6],
    };
    const drawn = {
      label: 'drawn by hand',
      style: 'solid' as const,
      colour: 'var(--ink)',
      energiesKeV: [2, 10],
      values: [9, 12],
    };
    const at = (element: HTMLElement) => element.querySelector('circle')?.getAttribute('cy');
    const { container: plain } = render(
      <ScanChart
        residuals={residuals}
        curves={[curve]}
        observable="fraction"
        width={400}
        height={300}
      />,
    );
    const { container: withDrawn } = render(
      <ScanChart
        residuals={residuals}
        curves={[curve]}
        drawn={drawn}
        observable="fraction"
        width={400}
        height={300}
      />,
    );
    expect(at(withDrawn)).toBe(at(plain));
  });
});

describe('residual chart', () => {
  it('draws bars for the fit and hollow circles for the compared model', () => {
    const { container } = render(
      <ResidualChart
        series={[
          { label: 'graded', style: 'solid', residuals },
          { label: 'sharp', style: 'dashed', residuals },
        ]}
        width={400}
        height={120}
      />,
    );
    expect(container.querySelectorAll('rect')).toHaveLength(3);
    expect(container.querySelectorAll('circle[fill="var(--paper)"]')).toHaveLength(3);
    expectSound(screen.getByRole('img', { name: /largest of graded is 1.0 at/ }));
  });
});

describe('stopping ridgeline', () => {
  it('draws interpolated profiles dashed, with a star at their energy', () => {
    const { container } = render(
      <StoppingRidgeline
        profiles={[ridge(2), ridge(6)]}
        interpolated={[6]}
        width={400}
        height={200}
      />,
    );
    expect(container.querySelectorAll('path[stroke-dasharray="3 2"]')).toHaveLength(1);
    expect(screen.getByText('6*')).toBeTruthy();
    expectSound(screen.getByRole('img'));
  });
});

describe('evidence table', () => {
  it('marks the model with the lowest AICc, and says where a number does not exist', () => {
    const row = { freeParameters: 4, deltaAicc: 0, weight: 0.7, chiSquare: 8.9 };
    render(
      <EvidenceTable
        rows={[
          { ...row, label: 'Graded edge', aicc: 21.9 },
          { ...row, label: 'Sharp edge', aicc: 24.3, weight: null },
        ]}
      />,
    );
    expect(screen.getByRole('row', { name: /Graded edge 8.9 4 21.9 0.70/ }).className).toContain(
      'font-semibold',
    );
    expect(screen.getByRole('row', { name: /Sharp edge 8.9 4 24.3 –/ }).className).not.toContain(
      'font-semibold',
    );
  });
});
