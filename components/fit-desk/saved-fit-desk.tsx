'use client';

import { useMemo } from 'react';

import type { ScanCurve } from '@/components/charts/chart-types';
import { Notice } from '@/components/ui/notice';
import { depthInformation, type FitInput } from '@/lib/inversion/index';
import type { Fit } from '@/lib/schemas/fit';
import type { Sample } from '@/lib/schemas/sample';

import { ChecksList } from './checks-list';
import { DepthPanel } from './depth-panel';
import { DeskColumns } from './desk-columns';
import { answerValues } from './drawn-values';
import { figureName } from './figure-name';
import { fitInputOf, pointsOf } from './fit-input';
import { FrozenSettings } from './frozen-settings';
import { ParameterTable } from './parameter-table';
import { curveEnergies, foldedCurve, prepareToDraw } from './prepared';
import { ProfileChoice } from './profile-choice';
import { profileKind } from './profile-kinds';
import { profileSeries, residualSeries, scaleErrorOf } from './profile-series';
import { ridgesOf } from './ridges';
import { ScanPanel } from './scan-panel';
import { useStoppingSet } from './use-desk-data';
import { useHover } from './use-hover';

const NO_RIDGES: ReturnType<typeof ridgesOf> = [];

/** A saved fit on the desk: frozen, to be looked at. */
export function SavedFitDesk({ fit, sample }: { fit: Fit; sample: Pick<Sample, 'carrier'> }) {
  const { spec, answer, carrierProfile } = fit;
  const stopping = useStoppingSet(fit.stoppingSetId);
  const points = useMemo(
    () => pointsOf(fit.points, spec.switchedOffKeV),
    [fit.points, spec.switchedOffKeV],
  );
  const { ridges, curve, information } = useFrozenFigures(fit, stopping.set);
  const depthScale = answer.parameters.find(({ name }) => name === 'depthScale')?.value ?? 1;
  const hover = useHover(ridges, points, { depthScale, capThicknessNm: spec.capThicknessNm });
  const main = useMemo(
    () => ({ kind: spec.profile, profile: carrierProfile, answer }),
    [spec.profile, carrierProfile, answer],
  );
  const profiles = useMemo(() => profileSeries(main, []), [main]);
  const residuals = useMemo(() => residualSeries(main, []), [main]);
  const offInScan = useMemo(
    () => new Set(fit.points.filter(({ enabled }) => !enabled).map(({ energyKeV }) => energyKeV)),
    [fit.points],
  );
  const interpolatedKeV = answer.residuals
    .filter(({ interpolated }) => interpolated)
    .map(({ energyKeV }) => energyKeV);
  const svgName = figureName(fit.sampleName, fit.name);

  return (
    <>
      {stopping.error !== null && (
        <Notice kind="problem" className="mt-3">
          The stopping set could not be read, so its ridges and the folded curve are missing:{' '}
          {stopping.error}
        </Notice>
      )}
      <DeskColumns
        assumed={
          <div className="grid gap-5">
            <ProfileChoice value={spec.profile} onChange={null} />
            <ParameterTable
              assumptions={spec}
              observable={fit.observable}
              answer={answer}
              drawn={{}}
              outOfDate={false}
              edit={null}
            />
            <FrozenSettings fit={fit} carrier={sample.carrier} />
            <ChecksList checks={fit.checks} outOfDate={false} />
          </div>
        }
        measured={
          <ScanPanel
            points={points}
            interpolatedKeV={interpolatedKeV}
            offInScan={offInScan}
            observable={fit.observable}
            curves={curve ? [curve] : []}
            drawnCurve={null}
            residuals={residuals}
            keep={[]}
            highlightedKeV={hover.energyKeV}
            speakingKeV={hover.speakingKeV}
            onReadEnergy={hover.onReadEnergy}
            edit={null}
            svgName={svgName}
          />
        }
        follows={
          <DepthPanel
            ridges={ridges}
            points={points}
            profiles={profiles}
            information={information}
            answer={answer}
            carrier={sample.carrier}
            polarity={spec.polarity}
            capThicknessNm={spec.capThicknessNm}
            depthScale={depthScale}
            scaleError={scaleErrorOf(spec.response)}
            outOfDate={false}
            highlightedKeV={hover.energyKeV}
            speakingKeV={hover.speakingKeV}
            onReadEnergy={hover.onReadEnergy}
            readDepthNm={hover.depthNm}
            onReadDepth={hover.onReadDepth}
            handle={null}
            svgName={`${svgName}-depth`}
          />
        }
      />
    </>
  );
}

/** What the figures need besides the saved numbers, folded again from the frozen input. */
function useFrozenFigures(fit: Fit, stopping: FitInput['stopping'] | null) {
  return useMemo(() => {
    if (!stopping) return { ridges: NO_RIDGES, curve: null, information: null };
    const input = fitInputOf(
      { observable: fit.observable, points: fit.points },
      fit.spec,
      stopping,
    );
    const ridges = ridgesOf(fit.points, stopping);
    const preparation = prepareToDraw(input);
    if (!preparation.ok) return { ridges, curve: null, information: null };
    const { prepared } = preparation;
    const curve: ScanCurve = foldedCurve(prepared, answerValues(fit.answer), curveEnergies(input), {
      label: profileKind(fit.spec.profile).short,
      style: 'solid',
    });
    const depthsNm = fit.carrierProfile.points.map(({ depthNm }) => depthNm);
    return {
      ridges,
      curve,
      information: { depthsNm, values: depthInformation(prepared, fit.answer, depthsNm) },
    };
  }, [fit, stopping]);
}
