'use client';

import { useRef, useState } from 'react';

import { Button } from '@/components/ui/button';

/** How the profile is named in a report. Where the clipboard is closed to us, the text is selected instead. */
export function Citation({ text }: { text: string }) {
  const words = useRef<HTMLParagraphElement>(null);
  const [said, setSaid] = useState('');
  const copy = async () => {
    try {
      await navigator.clipboard.writeText(text);
      setSaid('Copied.');
    } catch {
      if (words.current) getSelection()?.selectAllChildren(words.current);
      setSaid('The browser keeps its clipboard closed. The text is selected: copy it with Ctrl+C.');
    }
  };
  return (
    <div className="grid gap-2">
      <p ref={words} className="prose-measure font-serif">
        {text}
      </p>
      <p className="no-print flex flex-wrap items-center gap-3">
        <Button size="small" onClick={copy}>
          Copy the citation
        </Button>
        <span role="status" className="text-[0.8125rem] text-ink-2">
          {said}
        </span>
      </p>
    </div>
  );
}
