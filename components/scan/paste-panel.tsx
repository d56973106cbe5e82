'use client';

import { Button } from '@/components/ui/button';
import { Field } from '@/components/ui/field';
import { TextArea } from '@/components/ui/text-area';
import { fileFromText } from '@/components/upload/chosen-file';
import type { Scan } from '@/lib/schemas/scan';

import { ScanFilePreview } from './scan-file-preview';
import type { ScanFileModel } from './use-scan-file';

interface PastePanelProps {
  text: string;
  onText: (text: string) => void;
  /** The text was changed after it was read. */
  changed: boolean;
  model: ScanFileModel;
  observable: Scan['observable'];
}

const NAME = 'pasted.txt';

/** Pasted text is read like a file, and kept like one. */
export function PastePanel({ text, onText, changed, model, observable }: PastePanelProps) {
  return (
    <div className="grid grid-cols-1 gap-6">
      <div className="grid justify-items-start gap-2">
        <Field
          className="w-full"
          label="Table as text"
          hint="Paste lines of energy, value and σ. The text is kept as an original file."
          error={changed ? 'The text was changed after it was read; read it again.' : undefined}
        >
          <TextArea
            rows={8}
            className="figures"
            spellCheck={false}
            value={text}
            onChange={(event) => onText(event.target.value)}
            onPaste={(event) => {
              // A paste into an empty box is read at once; later changes are read when asked.
              if (text === '')
                model.take(
                  fileFromText(
                    NAME,
                    event.clipboardData.getData('text/plain').replace(/\r\n?/g, '\n'),
                  ),
                );
            }}
          />
        </Field>
        <Button disabled={text.trim() === ''} onClick={() => model.take(fileFromText(NAME, text))}>
          Read the text
        </Button>
      </div>
      <ScanFilePreview model={model} observable={observable} />
    </div>
  );
}
