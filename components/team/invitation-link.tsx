'use client';

import { useState } from 'react';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import { TextInput } from '@/components/ui/text-input';

/** Made in the browser, from the address that this person sees the server under. */
export function InvitationLink({ path }: { path: string }) {
  const link = new URL(path, window.location.origin).href;
  const [copied, setCopied] = useState<'no' | 'yes' | 'refused'>('no');

  async function copy() {
    try {
      await navigator.clipboard.writeText(link);
      setCopied('yes');
    } catch {
      // Browsers refuse without a secure connection: the field is there to copy by hand.
      setCopied('refused');
    }
  }

  return (
    <Notice kind="fine" title="The link is ready" alert>
      Send it to the person yourself. It shows only now, and opens once; until when stands below.
      <span className="mt-2 flex flex-wrap gap-2">
        <TextInput
          readOnly
          autoFocus
          aria-label="Invitation link"
          value={link}
          className="min-w-48 flex-1 figures"
          onFocus={(event) => event.target.select()}
        />
        <Button onClick={copy}>Copy</Button>
      </span>
      <span role="status" className="mt-1 block text-[0.8125rem] text-ink-2">
        {copied === 'yes' && 'Copied.'}
        {copied === 'refused' &&
          'The browser does not allow copying here; mark the link and copy it by hand.'}
      </span>
    </Notice>
  );
}
