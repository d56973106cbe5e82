import { TextLink } from '@/components/ui/text-link';
import { MAX_BINS, MAX_ENERGIES, MAX_FILE_BYTES } from '@/lib/inversion/index';

import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

const MIB = 1024 * 1024;

type FilesSectionProps = {
  templates: readonly { fileName: string; about: string }[];
};

export function FilesSection({ templates }: FilesSectionProps) {
  return (
    <HelpSection id="files" title={titleOf('files')}>
      <p>Each template holds invented numbers in the right shape; replace them with your own.</p>
      <ul className="grid gap-1.5">
        {templates.map(({ fileName, about }) => (
          <li key={fileName}>
            <TextLink
              href={`/help/templates/${fileName}`}
              prefetch={false}
              download
              className="figures"
            >
              {fileName}
            </TextLink>
            <span className="text-ink-2">: {about}</span>
          </li>
        ))}
      </ul>
      <dl className="grid gap-2.5">
        <Term name="Energy scan">
          Columns energy, value and σ, and if you like counts and a note. Values are diamagnetic
          fractions, capture rates in µs⁻¹, or asymmetry amplitudes: give the maximum asymmetry with
          its σ and they become fractions, F = A / A<sub>max</sub>. The σ of A<sub>max</sub> is
          common to all points and is kept apart from theirs.
        </Term>
        <Term name="Stopping profiles">
          Either one matrix, with a depth column and one column per energy whose heading holds the
          energy, or one file per energy, with the energy in its name or typed. Depth in nm, Å or
          µm, as centres or edges of bins; weights as counts or densities.
        </Term>
        <Term name="Form of the text">
          Comma, semicolon, tab or blanks between columns; point or comma as the decimal mark; with
          or without a heading; lines that begin with #, ; or % are comments. UTF-8.
        </Term>
        <Term name="Limits">
          {MAX_FILE_BYTES / MIB} MB a file, {MAX_ENERGIES} energies, {MAX_BINS.toLocaleString('en')}{' '}
          bins.
        </Term>
        <Term name="Bad rows">
          Each is named with its line, column and what was expected. Nothing is stored until the
          rows are mended or you leave them out by name. The original file is kept byte for byte,
          with its SHA-256.
        </Term>
      </dl>
    </HelpSection>
  );
}

function Term({ name, children }: { name: string; children: React.ReactNode }) {
  return (
    <div className="grid gap-x-5 sm:grid-cols-[9rem_minmax(0,1fr)]">
      <dt className="font-semibold">{name}</dt>
      <dd>{children}</dd>
    </div>
  );
}
