import type { ReactNode } from 'react';

/** A letter with a lower index: ŷ_i. */
export function Sub({ base, index }: { base: string; index: string }) {
  return (
    <msub>
      <mi>{base}</mi>
      <mi>{index}</mi>
    </msub>
  );
}

export function Frac({ top, bottom }: { top: ReactNode; bottom: ReactNode }) {
  return (
    <mfrac>
      <mrow>{top}</mrow>
      <mrow>{bottom}</mrow>
    </mfrac>
  );
}

export function Squared({ children }: { children: ReactNode }) {
  return (
    <msup>
      <mrow>{children}</mrow>
      <mn>2</mn>
    </msup>
  );
}

export function Sum({ over }: { over: string }) {
  return (
    <munder>
      <mo>∑</mo>
      <mi>{over}</mi>
    </munder>
  );
}

/** Round brackets that grow with what they hold. */
export function Round({ children }: { children: ReactNode }) {
  return (
    <mrow>
      <mo>(</mo>
      {children}
      <mo>)</mo>
    </mrow>
  );
}
