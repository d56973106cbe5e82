import type { ProfileKind } from '@/lib/schemas/fit';

import { PROFILE_KINDS } from './profile-kinds';

/** The trial profiles as a row of choices. */
export function ProfileChoice({
  value,
  onChange,
}: {
  value: ProfileKind;
  onChange: ((kind: ProfileKind) => void) | null;
}) {
  return (
    <fieldset>
      <legend className="mb-2 text-sm font-semibold text-ink-2">Trial profile</legend>
      <div className="flex flex-wrap gap-1.5">
        {PROFILE_KINDS.map(({ kind, label, says }) => (
          <label
            key={kind}
            title={says}
            className="cursor-pointer rounded-[5px] border border-edge/60 bg-sheet px-2.5 py-1.5 text-[0.8125rem] text-ink select-none has-checked:border-ink has-checked:bg-ink has-checked:font-semibold has-checked:text-paper has-focus-visible:outline-2 has-focus-visible:outline-offset-2 has-focus-visible:outline-tide has-disabled:cursor-default not-has-checked:has-disabled:text-ink-3"
          >
            <input
              type="radio"
              name="profile"
              value={kind}
              checked={value === kind}
              disabled={onChange === null}
              onChange={() => onChange?.(kind)}
              className="sr-only"
            />
            {label}
          </label>
        ))}
      </div>
    </fieldset>
  );
}
