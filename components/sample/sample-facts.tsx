import type { ReactNode } from 'react';

import type { Sample } from '@/lib/schemas/sample';

import { capText, dopingText, dopingType } from './carrier-words';

export function SampleFacts({ sample }: { sample: Sample }) {
  return (
    <div className="grid gap-4 pt-5">
      <dl className="flex flex-wrap gap-x-10 gap-y-3">
        <Fact name="Majority carriers">
          {sample.carrier} ({dopingType(sample.carrier)})
        </Fact>
        <Fact name="Doping">
          {dopingText(sample) ? <span className="figures">{dopingText(sample)}</span> : 'not known'}
        </Fact>
        <Fact name="Cap layer">{capText(sample) ?? 'none given'}</Fact>
        {sample.treatment && <Fact name="Treatment">{sample.treatment}</Fact>}
      </dl>
      {sample.notes && (
        <p className="prose-measure text-sm whitespace-pre-line text-ink-2">{sample.notes}</p>
      )}
    </div>
  );
}

function Fact({ name, children }: { name: string; children: ReactNode }) {
  return (
    <div>
      <dt className="text-[0.8125rem] text-ink-3">{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}
