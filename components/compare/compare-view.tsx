import { InventedMark } from '@/components/ui/invented-mark';
import { Notice } from '@/components/ui/notice';
import { PageHeader } from '@/components/ui/page-header';
import type { Fit, FitRow } from '@/lib/schemas/fit';

import { AssumptionTable } from './assumption-table';
import { assumptionRows } from './assumptions';
import { bandSentences } from './band-sentences';
import { CompareEvidence } from './compare-evidence';
import { CompareFigures } from './compare-figures';
import { ComparePicker } from './compare-picker';
import { fitMark } from './fit-mark';
import { ResultTable } from './result-table';
import { weighFits } from './weigh-fits';
import { WidthTests } from './width-tests';

interface CompareViewProps {
  /** Two to eight fits of one scan; the first is drawn solid. */
  fits: [Fit, ...Fit[]];
  /** Folded curve of each fit. */
  curves: { energiesKeV: number[]; values: number[] }[];
  /** Fits of the same scan that are not shown. */
  others: FitRow[];
  carrier: 'electrons' | 'holes';
}

/** Several fits of one scan over each other: what the data say, the figures, and where they part. */
export function CompareView({ fits, curves, others, carrier }: CompareViewProps) {
  const [first] = fits;
  const marks = fits.map((_, index) => fitMark(index));
  const { judged, rows, tests, sentences } = weighFits(fits);
  const bands = bandSentences(fits, marks);
  const marked = fits.map((fit, index) => ({ fit, mark: fitMark(index), name: fit.name }));
  return (
    <>
      <PageHeader
        breadcrumb={[
          { label: first.sampleName, href: `/samples/${first.sampleId}` },
          { label: first.scanName, href: `/scans/${first.scanId}` },
        ]}
        title={`Compare ${fits.length} fits`}
        badge={first.invented && <InventedMark />}
        meta={[`${first.answer.residuals.length} energies`, `scan “${first.scanName}”`]}
      />
      <div className="grid gap-x-10 gap-y-8 pt-6 lg:grid-cols-[minmax(0,3fr)_minmax(0,2fr)]">
        <section aria-labelledby="data-say" className="grid content-start gap-3">
          <h2 id="data-say" className="text-sm font-semibold text-ink-2">
            What the data say
          </h2>
          <p className="prose-measure font-serif text-xl leading-snug">{sentences[0]}</p>
          {sentences.slice(1).map((sentence) => (
            <p key={sentence} className="prose-measure text-sm text-ink-2">
              {sentence}
            </p>
          ))}
        </section>
        <ComparePicker shown={fits} others={others} />
      </div>
      {!judged.comparable && (
        <Notice kind="caution" title="Not comparable" className="mt-6">
          {judged.reason} ΔAICc and weights are left out of the table.
        </Notice>
      )}
      <div className="mt-8">
        <CompareFigures
          observable={first.observable}
          carrier={carrier}
          profiles={marked.map(({ fit, mark, name }) => ({
            mark,
            name,
            profile: fit.carrierProfile,
          }))}
          residuals={marked.map(({ fit, mark, name }) => ({
            mark,
            name,
            residuals: fit.answer.residuals,
          }))}
          curves={marked.map(({ mark, name }, index) => ({
            mark,
            name,
            energiesKeV: curves[index]?.energiesKeV ?? [],
            values: curves[index]?.values ?? [],
          }))}
        />
      </div>
      <section className="mt-10 grid gap-2" aria-labelledby="evidence">
        <h2 id="evidence">Evidence</h2>
        <CompareEvidence rows={rows} weighed={judged.comparable} />
        <WidthTests tests={tests} />
      </section>
      <div className="mt-10 grid gap-10">
        <section aria-labelledby="results">
          <h2 id="results" className="mb-2">
            Results, and where they disagree
          </h2>
          <ResultTable fits={fits} marks={marks} />
          {bands.length > 0 && (
            <ul className="mt-3 grid gap-1 text-sm text-ink-2">
              {bands.map((sentence) => (
                <li key={sentence}>{sentence}</li>
              ))}
            </ul>
          )}
          <p className="mt-3 prose-measure text-[0.8125rem] text-ink-3">
            Fits of one scan share its noise. Where their intervals do not meet, the assumptions
            differ, not the luck.
          </p>
        </section>
        <section aria-labelledby="assumptions">
          <h2 id="assumptions" className="mb-2">
            Where the assumptions differ
          </h2>
          <AssumptionTable rows={assumptionRows(fits)} marks={marks} />
        </section>
      </div>
    </>
  );
}
