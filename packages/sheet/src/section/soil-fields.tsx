// The soil of the draft as fields: its layers, or the survey that layers are fitted to.
import type { VNode } from 'preact';
import type { Desk } from '../desk/desk.ts';
import { rawText } from '../desk/json.ts';
import { ChoiceInput, type Option } from '../field/choice.tsx';
import { Pasting } from '../field/pasting.tsx';
import { WordButton } from '../field/word-button.tsx';
import { LayerFields } from './layer-fields.tsx';
import { Say } from './parts.tsx';

/** Numbers of layers that a survey may be fitted with; reading a study refuses any other. */
export const LAYER_COUNTS: readonly Option[] = [
  { value: 'auto', text: 'auto' },
  ...[1, 2, 3, 4, 5].map((count) => ({ value: count, text: String(count) })),
];

/** Number of layers to fit, in its sentence. */
export function LayerCount({ asked }: { asked: number | 'auto' }): VNode {
  return (
    <ChoiceInput
      path={['soil', 'layer_count']}
      label="number of layers to fit"
      value={asked}
      options={LAYER_COUNTS}
    />
  );
}

/** Layers of the study, or a word to begin with them. */
export function StatedSoil({ desk }: { desk: Desk }): VNode {
  if (desk.valueAt(['soil', 'layers']) === undefined) {
    return (
      <Say>
        The soil is not stated yet.{' '}
        <WordButton press={() => desk.edit(['soil'], { layers: [{}] })}>state its layers</WordButton>
      </Say>
    );
  }
  return (
    <Pasting table="layers" rows="layers from the surface down, resistivity and thickness">
      <Say>
        <LayerFields desk={desk} path={['soil', 'layers']} />
      </Say>
    </Pasting>
  );
}

/** The survey of a study whose layers have not been fitted yet. */
export function UnfittedSurvey({ desk }: { desk: Desk }): VNode {
  return (
    <Say>
      The soil is to be fitted to the readings in {rawText(desk.valueAt(['soil', 'survey']))}, with as many
      layers: <LayerCount asked="auto" />.
    </Say>
  );
}
