// The layers of a soil as fields in their sentence, with words to add and remove a layer.
import type { VNode } from 'preact';
import type { Desk, StudyPath } from '../desk/desk.ts';
import { itemsOf } from '../desk/json.ts';
import { layersWithOneMore, layersWithout } from '../desk/study-edits.ts';
import { QuantityInput } from '../field/inputs.tsx';
import { WordButton } from '../field/word-button.tsx';
import { LayerSentence } from './layer-sentence.tsx';

export interface LayerFieldsProps {
  readonly desk: Desk;
  /** place of the list of layers */
  readonly path: StudyPath;
  /** whose layers they are, where they are not the study's: ` in dry summer` */
  readonly of?: string;
}

/** Layers from the surface down; the last reaches to any depth and has no thickness. */
export function LayerFields({ desk, path, of = '' }: LayerFieldsProps): VNode {
  const stated = desk.valueAt(path);
  const layers = itemsOf(stated);
  return (
    <>
      <LayerSentence
        count={layers.length}
        resistivity={(k) => (
          <QuantityInput
            path={[...path, k, 'resistivity_ohm_m']}
            kind="resistivity"
            label={`resistivity of layer ${k + 1}${of}`}
          />
        )}
        thickness={(k) => (
          <QuantityInput
            path={[...path, k, 'thickness_m']}
            kind="length"
            label={`thickness of layer ${k + 1}${of}`}
          />
        )}
      />
      .{' '}
      <span class="edits">
        <WordButton press={() => desk.edit(path, layersWithOneMore(stated))} of={of.trim()}>
          add a layer below
        </WordButton>
        {layers.length > 1 &&
          layers.map((_, k) => (
            <WordButton
              key={k}
              press={() => desk.edit(path, layersWithout(stated, k))}
              of={of.trim()}
              vanishes
            >
              {`remove layer ${k + 1}`}
            </WordButton>
          ))}
      </span>
    </>
  );
}
