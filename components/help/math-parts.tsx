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

/** Round brackets; `tall` ones grow with the fraction that they hold. */
export function Round({ tall = false, children }: { tall?: boolean; children: ReactNode }) {
  const stretchy = tall ? 'true' : 'false';
  return (
    <mrow>
      <mo stretchy={stretchy}>(</mo>
      {children}
      <mo stretchy={stretchy}>)</mo>
    </mrow>
  );
}
