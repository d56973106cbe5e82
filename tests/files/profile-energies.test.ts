import { profileEnergies } from '@/lib/files/profile-energies';
import { readTable } from '@/lib/files/read-table';
import { expect, it } from 'vitest';

function table(name: string, text: string) {
  const result = readTable(name, new TextEncoder().encode(text));
  if (!result.ok) throw new Error('the test needs a readable table');
  return result.table;
}

const matrix = table('matrix.csv', 'depth_nm,2 keV,8 keV\n5,4,1\n15,3,3\n');
const single = table('late.txt', 'depth_nm counts\n5 40\n15 30\n');

it('gives a typed energy to the file that it was typed for, wherever a matrix stands', () => {
  expect(profileEnergies([matrix, single], [null, 20])).toEqual([2, 8, 20]);
  expect(profileEnergies([single, matrix], [20, null])).toEqual([20, 2, 8]);
});

it('keeps the headings of a matrix whatever is typed, and says null where nothing names one', () => {
  expect(profileEnergies([matrix], [5])).toEqual([2, 8]);
  expect(profileEnergies([single], [null])).toEqual([null]);
});
