'use client';

import { CarrierProfileChart } from '@/components/charts/carrier-profile-chart';
import { Figure } from '@/components/charts/figure';
import type { DrawnFit } from '@/components/review/fit-figures';
import { captureScaleError } from '@/components/review/scale-error';
import { carrierTable } from '@/components/review/fit-tables';

const HEIGHT = 420;

/** The issued profile with its bands, hatched where the scan says nothing. */
export function ProfileFigure({
  fit,
  carrier,
  fileName,
}: {
  fit: DrawnFit;
  carrier: 'electrons' | 'holes';
  fileName: string;
}) {
  const { carrierProfile, spec, edge } = fit;
  return (
    <Figure
      title="Carrier profile"
      svgName={fileName}
      height={HEIGHT}
      table={carrierTable(carrierProfile)}
    >
      {(width) => (
        <CarrierProfileChart
          profiles={[{ label: `${spec.profile} edge`, style: 'solid', profile: carrierProfile }]}
          edgeNm={edge?.value ?? null}
          carrier={carrier}
          scaleError={captureScaleError(spec)}
          width={width}
          height={HEIGHT}
        />
      )}
    </Figure>
  );
}
