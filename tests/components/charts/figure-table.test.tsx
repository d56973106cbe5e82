import { describe, expect, it } from 'vitest';

import { tableAsText, tableCell } from '@/components/charts/figure-table';

describe('data for the clipboard', () => {
  it('has every digit, blanks for what is not known, and stays in its cells', () => {
    const text = tableAsText({
      columns: ['depth (nm)', 'holes (cm⁻³)', 'flag'],
      rows: [
        [0.1 + 0.2, 6.2e15, 'beyond\treach'],
        [1, null, 'below\nfloor'],
      ],
    });
    expect(text).toBe(
      'depth (nm)\tholes (cm⁻³)\tflag\n0.30000000000000004\t6200000000000000\tbeyond reach\n1\t\tbelow floor\n',
    );
  });
});

describe('a cell on the page', () => {
  it('has six digits and a real minus sign', () => {
    expect(tableCell(-0.123456789)).toBe('−0.123457');
    expect(tableCell(null)).toBe('–');
  });
});
