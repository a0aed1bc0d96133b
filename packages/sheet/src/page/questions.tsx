// What a study has to state, as fields alone: the sheet of a draft that has not been solved yet.
import type { VNode } from 'preact';
import { useDesk } from '../desk/use-desk.ts';
import { UnitsContext } from '../desk/use-units.ts';
import { Fault } from '../section/fault.tsx';
import { Ground } from '../section/ground.tsx';
import { LimitBasis } from '../section/limits.tsx';
import { Part } from '../section/part.tsx';
import { Say } from '../section/parts.tsx';
import { MetalModel } from '../section/rise.tsx';
import { Season } from '../section/season.tsx';
import { Heading } from '../section/title.tsx';

/** The inputs of the sheet in its order, for a live page without an outcome. */
export function Questions(): VNode {
  const desk = useDesk();
  return (
    <UnitsContext.Provider value={desk?.units ?? 'SI'}>
      <article class="sheet">
        <header class="title-block">
          <Heading outcome={undefined} />
        </header>
        <Ground outcome={undefined} />
        <Fault outcome={undefined} />
        <Part id="rise" title="Rise" facts={[]} outcome={undefined}>
          <Say>
            The metal is taken as <MetalModel value="resistive" />.
          </Say>
        </Part>
        <Part id="people" title="People" facts={[]} outcome={undefined}>
          <LimitBasis basis={undefined} mass={undefined} />
        </Part>
        <Season outcome={undefined} />
      </article>
    </UnitsContext.Provider>
  );
}
