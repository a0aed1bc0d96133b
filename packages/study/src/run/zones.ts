// Ground people stand on: where the covering lies, and where the soil is bare.
import { areaRegion, partOf, type Region } from '@ohmstead/core';
import type { Prepared } from './prepare.ts';

export type Footing = 'covering' | 'bare';

export interface Zone {
  readonly footing: Footing;
  readonly touch: Region;
  readonly step: Region;
}

/** The assessed areas by what lies under the feet; one zone where there is no covering. */
export function zonesOf({ coveringArea, touchArea, stepArea }: Prepared): Zone[] {
  if (coveringArea === undefined)
    return [{ footing: 'bare', touch: areaRegion(touchArea), step: areaRegion(stepArea) }];
  const zone = (footing: Footing, side: 'inside' | 'outside'): Zone => ({
    footing,
    touch: partOf(touchArea, side, coveringArea),
    step: partOf(stepArea, side, coveringArea),
  });
  return [zone('covering', 'inside'), zone('bare', 'outside')];
}
