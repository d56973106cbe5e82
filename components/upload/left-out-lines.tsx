'use client';

import { Button } from '@/components/ui/button';

interface LeftOutLinesProps {
  fileName: string;
  lines: readonly number[];
  onTakeBack: (line: number) => void;
}

/** The lines that were switched off by name, each with its way back. */
export function LeftOutLines({ fileName, lines, onTakeBack }: LeftOutLinesProps) {
  if (lines.length === 0) return null;
  return (
    <div className="text-sm">
      <p className="text-ink-2">
        Left out of {fileName}: they stay in the original file and are not used.
      </p>
      <ul className="mt-1 flex max-h-40 flex-wrap gap-2 overflow-y-auto">
        {lines.map((line) => (
          <li key={line}>
            <Button size="small" variant="quiet" onClick={() => onTakeBack(line)}>
              Take line {line} back
            </Button>
          </li>
        ))}
      </ul>
    </div>
  );
}
