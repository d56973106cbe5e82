'use client';

import { useId } from 'react';

import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';

interface SaveBarProps {
  label: string;
  /** Why it cannot be saved yet; null when it can. */
  blocked: string | null;
  saving: boolean;
  refusal: string | null;
  onSave: () => void;
}

/** Save, with the reason beside it for as long as it may not be pressed. */
export function SaveBar({ label, blocked, saving, refusal, onSave }: SaveBarProps) {
  const reasonId = useId();
  return (
    <div className="grid gap-3">
      {refusal !== null && (
        <Notice kind="problem" title="Not saved" alert>
          {refusal} What you entered is still here.
        </Notice>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button
          variant="primary"
          disabled={blocked !== null}
          pending={saving}
          aria-describedby={blocked === null ? undefined : reasonId}
          onClick={onSave}
        >
          {saving ? 'Saving…' : label}
        </Button>
        <p id={reasonId} role="status" className="text-sm text-ink-2">
          {blocked ?? ''}
        </p>
      </div>
    </div>
  );
}
