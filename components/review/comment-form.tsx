'use client';

import { useState } from 'react';

import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextArea } from '@/components/ui/text-area';

import type { TargetGroup } from './comment-targets';

/** A comment on the whole fit, or on one point, depth or check of it. It empties once the server has it. */
export function CommentForm({
  fitId,
  groups,
  action,
}: {
  fitId: string;
  groups: readonly TargetGroup[];
  action: FormActionFunction;
}) {
  const [sent, setSent] = useState(0);
  return (
    <div className="no-print">
      <Form key={sent} label="Comment on this fit" action={action} onDone={() => setSent(sent + 1)}>
        <input type="hidden" name="id" value={fitId} />
        <Field name="target" label="About" className="max-w-72">
          <Select defaultValue="">
            <option value="">the whole fit</option>
            {groups.map((group) => (
              <optgroup key={group.label} label={group.label}>
                {group.targets.map((target) => (
                  <option key={target.value} value={target.value}>
                    {target.label}
                  </option>
                ))}
              </optgroup>
            ))}
          </Select>
        </Field>
        <Field name="body" label="Comment" required>
          <TextArea rows={4} />
        </Field>
        <div className="flex items-center gap-3">
          <SubmitButton variant="secondary" pendingLabel="Sending…">
            Comment
          </SubmitButton>
          <span role="status" className="text-[0.8125rem] text-ink-3">
            {sent > 0 && 'Comment added.'}
          </span>
        </div>
      </Form>
    </div>
  );
}
