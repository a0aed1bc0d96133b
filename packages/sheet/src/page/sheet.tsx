// The sheet: its parts in the order the work is reasoned.
import type { Outcome } from '@ohmstead/study';
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { UnitsContext } from '../desk/use-units.ts';
import { Assumed } from '../section/assumed.tsx';
import { Cautions } from '../section/cautions.tsx';
import { Electrode } from '../section/electrode.tsx';
import { Fault } from '../section/fault.tsx';
import { Ground } from '../section/ground.tsx';
import { People } from '../section/people.tsx';
import { Rise } from '../section/rise.tsx';
import { Season } from '../section/season.tsx';
import { Surface } from '../section/surface.tsx';
import { TitleBlock } from '../section/title.tsx';
import { Trust } from '../section/trust.tsx';

/**
 * The whole sheet as a component, the same in a page that is frozen and in one that is alive.
 * @param props.outcome of a solved study
 */
export function Sheet({ outcome }: { outcome: Outcome }): VNode {
  const desk = useDesk();
  return (
    <UnitsContext.Provider value={desk?.units ?? outcome.study.display_units ?? 'SI'}>
      <article class="sheet">
        <TitleBlock outcome={outcome} />
        <Ground outcome={outcome} />
        <Electrode outcome={outcome} />
        <Fault outcome={outcome} />
        <Rise outcome={outcome} />
        <Surface outcome={outcome} />
        <People outcome={outcome} />
        <Season outcome={outcome} />
        <Trust outcome={outcome} />
        <Assumed outcome={outcome} />
        <Cautions />
        <p class="print-note">
          This browser prints folded parts only if they are unfolded first; the tables are also in the files
          beside this page.
        </p>
      </article>
    </UnitsContext.Provider>
  );
}
