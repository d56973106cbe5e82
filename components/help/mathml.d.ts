import type { HTMLAttributes } from 'react';

type Attributes = HTMLAttributes<MathMLElement> & {
  display?: 'block' | 'inline';
  stretchy?: 'true' | 'false';
};

/** React draws MathML, but its types leave the elements out. Only those that the help page uses. */
declare module 'react' {
  namespace JSX {
    interface IntrinsicElements {
      math: Attributes;
      mrow: Attributes;
      mi: Attributes;
      mn: Attributes;
      mo: Attributes;
      mtext: Attributes;
      mfrac: Attributes;
      msqrt: Attributes;
      msub: Attributes;
      msup: Attributes;
      msubsup: Attributes;
      munder: Attributes;
    }
  }
}
