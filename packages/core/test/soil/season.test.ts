import { describe, expect, it } from 'vitest';
import { seasonalSoil } from '../../src/soil/season.ts';
import { soil } from '../support/soils.ts';

const base = soil([200, 1], [50, 3], [800, 4], [20]);

describe('a soil in another season', () => {
  it('is frozen or dried to a depth within a layer, the rest of it and what lies below unchanged', () => {
    expect(seasonalSoil(base, { kind: 'top', depth: 0.6, resistivity: 2000 })).toEqual(
      soil([2000, 0.6], [200, 0.4], [50, 3], [800, 4], [20]),
    );
  });

  it('loses the layers that the frost reaches through', () => {
    expect(seasonalSoil(base, { kind: 'top', depth: 2.5, resistivity: 1500 })).toEqual(
      soil([1500, 2.5], [50, 1.5], [800, 4], [20]),
    );
  });

  it('is wet below a water table, whatever lay there', () => {
    expect(seasonalSoil(base, { kind: 'below', depth: 2, resistivity: 30 })).toEqual(
      soil([200, 1], [50, 1], [30]),
    );
    expect(seasonalSoil(base, { kind: 'below', depth: 12, resistivity: 9 })).toEqual(
      soil([200, 1], [50, 3], [800, 4], [20, 4], [9]),
    );
  });

  it('leaves no sliver where the depth is an interface', () => {
    expect(seasonalSoil(base, { kind: 'top', depth: 1, resistivity: 900 })).toEqual(
      soil([900, 1], [50, 3], [800, 4], [20]),
    );
    expect(seasonalSoil(base, { kind: 'below', depth: 1.004, resistivity: 30 }).layers).toHaveLength(2);
  });
});
