import type { Design } from '#analysis/maths/firth.ts';

/** One batch a row, intercept first: `columns[j][i]` is the value of term j + 1 for batch i. */
export function designOf(found: readonly number[], columns: readonly (readonly number[])[]): Design {
  const groups = found.length;
  const terms = columns.length + 1;
  const x = new Float64Array(groups * terms);
  for (let i = 0; i < groups; i++) {
    x[i * terms] = 1;
    for (const [j, column] of columns.entries()) x[i * terms + j + 1] = column[i]!;
  }
  return { groups, terms, x, weight: new Float64Array(groups).fill(1), found: Float64Array.from(found), offset: new Float64Array(groups) };
}
