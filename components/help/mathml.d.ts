import type { HTMLAttributes } from 'react';

type MathAttributes = HTMLAttributes<MathMLElement> & {
  display?: 'block' | 'inline';
  stretchy?: 'true' | 'false';
};

/** React draws MathML, but its types leave the elements out. Only those that the help page uses. */
declare module 'react' {
  namespace JSX {
    interface IntrinsicElements {
      math: MathAttributes;
      mrow: MathAttributes;
      mi: MathAttributes;
      mn: MathAttributes;
      mo: MathAttributes;
      mtext: MathAttributes;
      mfrac: MathAttributes;
      msqrt: MathAttributes;
      msub: MathAttributes;
      msup: MathAttributes;
      msubsup: MathAttributes;
      munder: MathAttributes;
    }
  }
}
