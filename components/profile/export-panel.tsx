'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';

import { saveAs } from '@/components/charts/save-as';
import { buttonStyle } from '@/components/ui/button-style';
import { Field } from '@/components/ui/field';
import { Notice } from '@/components/ui/notice';
import { Select } from '@/components/ui/select';
import { TextInput } from '@/components/ui/text-input';
import type { CarrierProfile } from '@/lib/inversion/index';

import { exportPath, exportQuery, readStep, type ExportChoice } from './export-choice';
import { exportPreview } from './export-preview';

const PREVIEW_ROWS = 5;

interface ExportPanelProps {
  profileId: string;
  number: string;
  profile: CarrierProfile;
  /** The choice that the address names. */
  initial: ExportChoice;
  maxRows: number;
}

/** Grid and units of the CSV, what the file will look like, and the file. The address follows the choice. */
export function ExportPanel({ profileId, number, profile, initial, maxRows }: ExportPanelProps) {
  const [choice, setChoice] = useState(initial);
  const change = (part: Partial<ExportChoice>) => {
    const next = { ...choice, ...part };
    setChoice(next);
    history.replaceState(null, '', `?${exportQuery(next)}`);
  };
  const uniform = choice.grid === 'uniform';
  const step = readStep(choice.step, profile.points.at(-1)?.depthNm ?? 0, maxRows);
  const ready = !uniform || step.ok;
  const rows = !uniform ? profile.points.length : step.ok ? step.rows : 0;
  const isShare = profile.unit === 'populated share';
  return (
    <div className="grid content-start gap-4">
      <div className="grid gap-4 sm:grid-cols-2">
        <Field label="Grid">
          <Select
            value={choice.grid}
            onChange={(event) =>
              change({ grid: event.target.value === 'uniform' ? 'uniform' : 'fit' })
            }
            options={[
              { value: 'fit', label: 'grid of the fit, fine at the edge' },
              { value: 'uniform', label: 'uniform step' },
            ]}
          />
        </Field>
        {uniform ? (
          <Field label="Step" unit="nm" error={step.ok ? undefined : step.message}>
            <TextInput
              numeric
              value={choice.step}
              onChange={(event) => change({ step: event.target.value })}
            />
          </Field>
        ) : (
          <div className="hidden sm:block" />
        )}
        <Field label="Depth in">
          <Select
            value={choice.depthUnit}
            onChange={(event) => change({ depthUnit: depthUnitOf(event.target.value) })}
            options={[
              { value: 'nm', label: 'nm' },
              { value: 'um', label: 'µm' },
              { value: 'cm', label: 'cm' },
            ]}
          />
        </Field>
        <Field
          label="Concentration in"
          hint={isShare ? 'No effect: this profile is a populated share.' : undefined}
        >
          <Select
            disabled={isShare}
            value={choice.concentrationUnit}
            onChange={(event) =>
              change({ concentrationUnit: event.target.value === 'm-3' ? 'm-3' : 'cm-3' })
            }
            options={[
              { value: 'cm-3', label: 'cm⁻³' },
              { value: 'm-3', label: 'm⁻³' },
            ]}
          />
        </Field>
      </div>
      {ready && (
        <Preview
          lines={exportPreview(
            profile,
            choice,
            uniform && step.ok ? step.stepNm : null,
            Math.min(rows, PREVIEW_ROWS),
          )}
          rows={rows}
          interpolated={uniform}
        />
      )}
      <Download path={ready ? exportPath(profileId, choice) : null} fileName={`${number}.csv`} />
    </div>
  );
}

function depthUnitOf(value: string): ExportChoice['depthUnit'] {
  return value === 'um' || value === 'cm' ? value : 'nm';
}

function Preview({
  lines,
  rows,
  interpolated,
}: {
  lines: readonly string[];
  rows: number;
  interpolated: boolean;
}) {
  return (
    <div className="grid gap-1">
      <pre
        className="overflow-x-auto border-y border-rule py-2 figures text-[0.8125rem] leading-relaxed"
        tabIndex={0}
        aria-label="First lines of the file"
      >
        {lines.join('\n')}
        {lines.length - 1 < rows && '\n…'}
      </pre>
      <p className="text-[0.8125rem] text-ink-3">
        {rows.toLocaleString('en')} rows, below a head of # lines with identity, citation, units,
        model, parameters, checks and hashes.
        {interpolated &&
          ' The numbers shown here are interpolated between the depths of the fit; the file computes them anew.'}
      </p>
    </div>
  );
}

/** A link that also says how it goes: a uniform grid resamples the bands, which takes a moment. */
function Download({ path, fileName }: { path: string | null; fileName: string }) {
  const router = useRouter();
  const [state, setState] = useState<
    { kind: 'idle' | 'busy' | 'done' } | { kind: 'failed'; why: string }
  >({ kind: 'idle' });
  const download = async (from: string) => {
    setState({ kind: 'busy' });
    try {
      const response = await fetch(from);
      if (!response.ok) throw new Error(await sentenceOf(response));
      saveAs(fileName, await response.blob());
      setState({ kind: 'done' });
      router.refresh();
    } catch (error) {
      const why = error instanceof Error ? error.message : 'The server did not answer.';
      setState({ kind: 'failed', why });
    }
  };
  const busy = state.kind === 'busy';
  return (
    <div className="grid gap-3">
      <p className="flex flex-wrap items-center gap-3">
        <a
          href={path ?? undefined}
          role={path ? undefined : 'link'}
          aria-disabled={!path || busy || undefined}
          className={buttonStyle({ variant: 'primary' })}
          onClick={(event) => {
            event.preventDefault();
            if (path && !busy) void download(path);
          }}
        >
          {busy ? 'Preparing the file…' : 'Download the CSV'}
        </a>
        <span role="status" className="text-[0.8125rem] text-ink-2">
          {state.kind === 'done' && 'Downloaded. It is noted in the history.'}
        </span>
      </p>
      {state.kind === 'failed' && (
        <Notice kind="problem" alert title="The file was not made">
          {state.why}
        </Notice>
      )}
    </div>
  );
}

/** The server's own sentence, or its status where the answer is not from the product. */
async function sentenceOf(response: Response): Promise<string> {
  const text = await response.text();
  try {
    const answer: unknown = JSON.parse(text);
    if (typeof answer === 'object' && answer !== null && 'error' in answer) {
      const { error } = answer;
      if (typeof error === 'object' && error !== null && 'message' in error)
        return String(error.message);
    }
  } catch {
    // Not JSON: a proxy or a half-started server answered; its page would help nobody here.
  }
  return `The server answered ${response.status}. Nothing was changed; try again.`;
}
