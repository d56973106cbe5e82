import type { ReactNode } from 'react';

type FormulaProps = {
  /** The same in words, for readers whose browser does not speak mathematics. */
  words: string;
  children: ReactNode;
};

/** One formula on its own line. */
export function Formula({ words, children }: FormulaProps) {
  return (
    <p
      className="overflow-x-auto border-l border-rule py-2 pl-5"
      tabIndex={0}
      role="group"
      aria-label={words}
    >
      <math display="block">
        <mrow>{children}</mrow>
      </math>
    </p>
  );
}
