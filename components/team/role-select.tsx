'use client';

import { startTransition, useActionState, useOptimistic } from 'react';

import type { FormActionFunction } from '@/components/ui/form-state';
import { Mark } from '@/components/ui/mark';
import { Select } from '@/components/ui/select';
import { ROLES, roleSchema, type Role } from '@/lib/schemas/common';

import { ROLE_WORDS } from './role-words';

type RoleSelectProps = {
  action: FormActionFunction<null>;
  userId: string;
  name: string;
  role: Role;
};

/** Changes a role as soon as another is chosen; a refusal puts the old one back and says why. */
export function RoleSelect({ action, userId, name, role }: RoleSelectProps) {
  const [state, change, pending] = useActionState(action, null);
  const [shown, show] = useOptimistic(role);
  return (
    <div className="grid max-w-48 gap-1">
      <Select
        aria-label={`Role of ${name}`}
        value={shown}
        disabled={pending}
        className="py-1 text-sm"
        options={ROLES.map((value) => ({ value, label: ROLE_WORDS[value].label }))}
        onChange={(event) => {
          const next = roleSchema.parse(event.target.value);
          startTransition(() => {
            show(next);
            change({ userId, role: next });
          });
        }}
      />
      <span role="status" className="text-[0.8125rem] text-coral-ink">
        {state?.ok === false && (
          <span className="flex gap-1.5">
            <Mark kind="problem" className="mt-0.5" /> {state.message}
          </span>
        )}
      </span>
    </div>
  );
}
