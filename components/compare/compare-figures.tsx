'use client';

import { Figure } from '@/components/charts/figure';
import type { Observable } from '@/lib/inversion/index';

import { CompareProfileChart, type MarkedProfile } from './compare-profile-chart';
import { CompareScanChart, type MarkedCurve } from './compare-scan-chart';
import { profileTable, residualTable, scanTable } from './compare-tables';
import { ResidualRows, residualRowsHeight, type MarkedResiduals } from './residual-rows';

interface CompareFiguresProps {
  profiles: MarkedProfile[];
  residuals: MarkedResiduals[];
  curves: MarkedCurve[];
  observable: Observable;
  carrier: 'electrons' | 'holes';
}

const PROFILE_HEIGHT = 420;
const SCAN_HEIGHT = 340;

/** Profiles, scan and residuals of several fits. */
export function CompareFigures({
  profiles,
  residuals,
  curves,
  observable,
  carrier,
}: CompareFiguresProps) {
  const rowsHeight = residualRowsHeight(residuals.length);
  return (
    <div className="grid gap-8 lg:grid-cols-2">
      <div className="grid min-w-0 content-start gap-6">
        <Figure
          title="Energy scan"
          svgName="compare-scan"
          height={SCAN_HEIGHT}
          table={scanTable(residuals)}
        >
          {(width) => (
            <CompareScanChart
              residuals={residuals[0]?.residuals ?? []}
              curves={curves}
              observable={observable}
              width={width}
              height={SCAN_HEIGHT}
            />
          )}
        </Figure>
        <Figure
          title="Residuals"
          svgName="compare-residuals"
          height={rowsHeight}
          table={residualTable(residuals)}
        >
          {(width) => <ResidualRows rows={residuals} width={width} />}
        </Figure>
      </div>
      <div className="min-w-0">
        <Figure
          title="Carrier profiles"
          svgName="compare-profiles"
          height={PROFILE_HEIGHT}
          table={profileTable(profiles)}
        >
          {(width) => (
            <CompareProfileChart
              profiles={profiles}
              carrier={carrier}
              width={width}
              height={PROFILE_HEIGHT}
            />
          )}
        </Figure>
        <p className="mt-1 text-[0.8125rem] text-ink-3">
          Bands, 68 % and 95 %, and hatching are those of fit A. Put another fit first to see its
          own.
        </p>
      </div>
    </div>
  );
}
