import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

import { auditWords } from '@/components/team/audit-words';

const ACCESS = 'db/access';

/** Every act that a verb of the server writes into the audit trail, read from its source. */
function acts(): string[] {
  const sources = readdirSync(ACCESS, { recursive: true, encoding: 'utf8' }).filter((name) =>
    name.endsWith('.ts'),
  );
  const found = sources.flatMap((name) =>
    [...readFileSync(join(ACCESS, name), 'utf8').matchAll(/verb: '([a-z-]+)'/g)].map(
      ([, act]) => act ?? '',
    ),
  );
  return [...new Set(found)].sort();
}

describe('the words of the audit trail', () => {
  it('reads as a sentence without its person', () => {
    expect(auditWords('submit-fit')).toBe('sent fit to review');
    expect(auditWords('comment-fit')).toBe('commented on fit');
    expect(auditWords('create-stopping-set')).toBe('added stopping set');
    expect(auditWords('sign-up')).toBe('signed up');
  });

  it('knows every act that the server writes', () => {
    expect(acts().length).toBeGreaterThan(10);
    const unknown = acts().filter((act) => auditWords(act) === act.replaceAll('-', ' '));
    expect(unknown).toEqual([]);
  });
});
