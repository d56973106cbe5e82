import type { ReactNode } from 'react';

import { InventedMark } from '@/components/ui/invented-mark';

/** The name of a row, with the mark of invented data where the list as a whole does not carry it. */
export function Named({ marked, children }: { marked: boolean; children: ReactNode }) {
  return (
    <span className="inline-flex flex-wrap items-center gap-x-2 gap-y-1">
      {children}
      {marked && <InventedMark />}
    </span>
  );
}
