import { Dialog as BaseDialog } from '@base-ui/react/dialog';
import type { ReactNode } from 'react';

import { cn } from './cn';

/** The sheet of a dialog with its backdrop: shared by Dialog and ConfirmDialog. */
export function DialogSheet({ wide = false, children }: { wide?: boolean; children: ReactNode }) {
  return (
    <BaseDialog.Portal>
      <BaseDialog.Backdrop className="fixed inset-0 z-40 bg-ink/35 dark:bg-paper/70" />
      <BaseDialog.Popup
        className={cn(
          'fixed top-1/2 left-1/2 z-50 grid max-h-[calc(100dvh-2rem)] w-[calc(100vw-2rem)] -translate-x-1/2 -translate-y-1/2 gap-4 overflow-y-auto rounded-[6px] border border-ink-2 bg-paper p-5 text-[0.9375rem] text-ink sm:p-6',
          wide ? 'max-w-3xl' : 'max-w-md',
        )}
      >
        {children}
      </BaseDialog.Popup>
    </BaseDialog.Portal>
  );
}
