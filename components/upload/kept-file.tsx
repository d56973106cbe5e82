import { ButtonLink } from '@/components/ui/button-link';

import { byteWords } from './byte-words';

interface KeptFileProps {
  file: { id: string; name: string; sha256: string; byteLength: number };
}

/** An original file, kept byte for byte, with what proves it. */
export function KeptFile({ file }: KeptFileProps) {
  return (
    <div className="flex flex-wrap items-start justify-between gap-x-4 gap-y-2 border-b border-rule py-2 text-sm">
      <div className="min-w-0">
        <p>
          <span className="font-medium break-all">{file.name}</span>{' '}
          <span className="text-ink-2" title={`${file.byteLength} bytes`}>
            {byteWords(file.byteLength)}
          </span>
        </p>
        <p className="figures text-xs break-all text-ink-3">SHA-256 {file.sha256}</p>
      </div>
      <ButtonLink
        size="small"
        href={`/api/files/${file.id}`}
        prefetch={false}
        download={file.name}
        aria-label={`Download ${file.name}`}
      >
        Download
      </ButtonLink>
    </div>
  );
}
