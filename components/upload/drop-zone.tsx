'use client';

import { clsx } from 'clsx';
import { useId, useState } from 'react';
import { useDropzone } from 'react-dropzone';

import { MAX_FILE_BYTES } from '@/lib/inversion/index';

import { byteWords } from './byte-words';
import { takeFile, type ChosenFile } from './chosen-file';

interface DropZoneProps {
  label: string;
  hint: string;
  multiple: boolean;
  onFiles: (files: ChosenFile[]) => void;
}

/** Drop or choose text files. What is too large or cannot be read is said and not taken. */
export function DropZone({ label, hint, multiple, onFiles }: DropZoneProps) {
  const id = useId();
  const [refused, setRefused] = useState<readonly string[]>([]);
  const take = async (files: readonly File[]) => {
    const { taken, refused: reasons } = await takeAll(multiple ? files : files.slice(0, 1));
    const surplus =
      multiple || files.length < 2
        ? []
        : [`Only ${files[0]?.name ?? ''} was taken: a scan is one file.`];
    setRefused([...reasons, ...surplus]);
    if (taken.length > 0) onFiles(taken);
  };
  const { getRootProps, getInputProps, isDragActive } = useDropzone({
    multiple: true,
    noKeyboard: true,
    noClick: true,
    onDrop: (files) => void take(files),
  });
  return (
    <div>
      <div
        {...getRootProps()}
        className={clsx(
          'rounded border border-dashed px-4 py-5 text-sm',
          isDragActive ? 'border-kelp bg-sheet' : 'border-edge',
        )}
      >
        <label htmlFor={id} className="font-medium">
          {label}
        </label>
        <p id={`${id}-hint`} className="mt-0.5 text-ink-2">
          {hint}
        </p>
        <input
          {...getInputProps({ multiple, id, 'aria-describedby': `${id}-hint` })}
          // Shown, so that the browser's own button works with keyboard, touch and speech.
          style={undefined}
          tabIndex={0}
          className="mt-3 block w-full max-w-full file:mr-3 file:cursor-pointer file:rounded file:border file:border-solid file:border-edge file:bg-sheet file:px-3 file:py-1.5 file:font-medium file:text-ink"
        />
      </div>
      <ul role="alert" className="mt-2 space-y-1 text-sm text-coral-ink empty:hidden">
        {refused.map((reason) => (
          <li key={reason}>{reason}</li>
        ))}
      </ul>
    </div>
  );
}

async function takeAll(
  files: readonly File[],
): Promise<{ taken: ChosenFile[]; refused: string[] }> {
  const taken: ChosenFile[] = [];
  const refused: string[] = [];
  for (const file of files) {
    if (file.size > MAX_FILE_BYTES) {
      refused.push(
        `${file.name} has ${byteWords(file.size)}; expected at most ${byteWords(MAX_FILE_BYTES)}. It was not taken.`,
      );
      continue;
    }
    try {
      taken.push(await takeFile(file));
    } catch (cause) {
      const reason = cause instanceof Error ? cause.message : 'no reason given';
      refused.push(`${file.name} could not be read by the browser (${reason}). It was not taken.`);
    }
  }
  return { taken, refused };
}
