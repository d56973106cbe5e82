import { Moment } from '@/components/ui/moment';
import { TextLink } from '@/components/ui/text-link';
import type { IssuedProfile } from '@/lib/schemas/profile';

export interface OriginalFile {
  id: string;
  name: string;
  sha256: string;
  byteLength: number;
}

/** Who made it, who accepted it, when, and from which files. */
export function Provenance({
  profile,
  scanFile,
  stoppingFiles,
}: {
  profile: IssuedProfile;
  /** Null where the points were typed. */
  scanFile: OriginalFile | null;
  stoppingFiles: readonly OriginalFile[];
}) {
  const { fit } = profile;
  return (
    <dl className="grid gap-x-6 gap-y-1.5 text-sm sm:grid-cols-[max-content_minmax(0,1fr)]">
      <Row label="Fitted by">
        {profile.fittedBy}, <Moment at={fit.createdAt} />
      </Row>
      <Row label="Accepted by">
        {profile.issuedBy}, <Moment at={profile.issuedAt} />
      </Row>
      <Row label="Fit">
        <TextLink href={`/reviews/${fit.id}`}>{fit.name}</TextLink>
        {fit.parent && (
          <>
            , made from <TextLink href={`/fits/${fit.parent.id}`}>{fit.parent.name}</TextLink>
          </>
        )}
      </Row>
      <Row label="Scan">
        <TextLink href={`/scans/${fit.scanId}`}>{fit.scanName}</TextLink>
        {fit.scanChangedSince && ' (edited since; the profile rests on the points as they were)'}
      </Row>
      <Row label="Scan file">
        {scanFile ? <FileLink file={scanFile} /> : 'none: the points were typed or pasted'}
      </Row>
      <Row label="Stopping set">
        <TextLink href={`/stopping/${fit.stoppingSetId}`}>{fit.stoppingSetName}</TextLink>
      </Row>
      <Row label={stoppingFiles.length === 1 ? 'Stopping file' : 'Stopping files'}>
        {stoppingFiles.length <= 3 ? (
          <FileList files={stoppingFiles} />
        ) : (
          <details>
            <summary className="w-fit">{stoppingFiles.length} files</summary>
            <FileList files={stoppingFiles} />
          </details>
        )}
      </Row>
      <Row label="Hash of the points">
        <Hash value={fit.hashes.points} />
      </Row>
      <Row label="Hash of the stopping set">
        <Hash value={fit.hashes.stoppingSet} />
      </Row>
      <Row label="Hash of all inputs">
        <Hash value={fit.hashes.inputs} />
      </Row>
    </dl>
  );
}

function Row({ label, children }: { label: string; children: React.ReactNode }) {
  return (
    <div className="contents">
      <dt className="text-ink-3">{label}</dt>
      <dd className="mb-1 min-w-0 sm:mb-0">{children}</dd>
    </div>
  );
}

function Hash({ value }: { value: string }) {
  return <span className="figures text-[0.8125rem] break-all">{value}</span>;
}

function FileList({ files }: { files: readonly OriginalFile[] }) {
  return (
    <ul className="grid gap-1">
      {files.map((file) => (
        <li key={file.id}>
          <FileLink file={file} />
        </li>
      ))}
    </ul>
  );
}

/** The file byte for byte as it came in. */
function FileLink({ file }: { file: OriginalFile }) {
  return (
    <>
      <a href={`/api/files/${file.id}`} download className="text-link">
        {file.name}
      </a>{' '}
      <span className="text-ink-3">
        ({file.byteLength.toLocaleString('en')} bytes, SHA-256{' '}
        <span className="figures">{file.sha256.slice(0, 12)}…</span>)
      </span>
    </>
  );
}
