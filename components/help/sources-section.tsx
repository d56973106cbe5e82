import { HelpSection } from './help-section';
import { titleOf } from './help-topics';

const SOURCES = [
  'M. Abramowitz and I. A. Stegun, Handbook of Mathematical Functions (1964), chapters 7 and 26.',
  'K. P. Burnham and D. R. Anderson, Model Selection and Multimodel Inference (2002), sections 2.4 and 2.9.',
  'B. Efron and R. J. Tibshirani, An Introduction to the Bootstrap (1993), sections 6.5 and 13.',
  'G. H. Golub and V. Pereyra, SIAM J. Numer. Anal. 10, 413 (1973).',
  'C. M. Hurvich and C.-L. Tsai, Biometrika 76, 297 (1989).',
  'K. Levenberg, Q. Appl. Math. 2, 164 (1944); D. W. Marquardt, J. Soc. Ind. Appl. Math. 11, 431 (1963).',
  'Particle Data Group, Review of Particle Physics, introduction: rounding.',
  'S. G. Self and K.-Y. Liang, J. Am. Stat. Assoc. 82, 605 (1987).',
  'Y. Shafranovich, RFC 4180 (2005): comma-separated values.',
];

export function SourcesSection() {
  return (
    <HelpSection id="sources" title={titleOf('sources')}>
      <ul className="grid gap-1.5 text-sm">
        {SOURCES.map((source) => (
          <li key={source}>{source}</li>
        ))}
      </ul>
    </HelpSection>
  );
}
