'use client';

import { useState } from 'react';

import { Field } from '@/components/ui/field';
import { Form } from '@/components/ui/form';
import type { FormActionFunction } from '@/components/ui/form-state';
import { Select } from '@/components/ui/select';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextInput } from '@/components/ui/text-input';
import { ROLES } from '@/lib/schemas/common';

import { InvitationLink } from './invitation-link';
import { ROLE_WORDS } from './role-words';

const CHOICES = ROLES.map((role) => ({ value: role, label: ROLE_WORDS[role].label }));

/** The link shows once, here; the server keeps only its hash. */
export function InviteForm({ action }: { action: FormActionFunction<{ path: string }> }) {
  const [path, setPath] = useState<string | null>(null);
  return (
    <div className="grid gap-4">
      <Form
        // A new form for the next person, once a link is made.
        key={path}
        action={action}
        label="Invite a person"
        className="items-start sm:grid-cols-[minmax(0,1fr)_minmax(0,1fr)_auto]"
        onDone={(answer) => setPath(answer?.path ?? null)}
      >
        <Field label="E-mail" name="email" required>
          <TextInput type="email" spellCheck={false} />
        </Field>
        <Field label="Role" name="role" required>
          <Select defaultValue="analyst" options={CHOICES} />
        </Field>
        <SubmitButton className="sm:mt-6" pendingLabel="Making the link …">
          Make a link
        </SubmitButton>
      </Form>
      {path && <InvitationLink key={path} path={path} />}
    </div>
  );
}
