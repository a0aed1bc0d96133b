// Tells the layers of a soil as part of a sentence.
import type { DisplayUnits, Results } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import { useUnits } from '../desk/use-units.ts';
import { QuantityInput } from '../field/inputs.tsx';
import { fittedQuantity, shortQuantity } from '../format/fitted.ts';
import { fittedLength } from '../format/fitted-length.ts';
import { lengthUnit } from '../format/length.ts';
import { givenQuantity } from '../format/number.ts';
import { quantityText } from '../format/quantity-text.ts';
import { LayerSentence } from './layer-sentence.tsx';
import { Result } from './parts.tsx';

/** Where layers come from: stated in the study, fitted to readings, or following from either in another season. */
export type LayerOrigin = 'stated' | 'fitted' | 'from stated' | 'from fitted';

export interface LayersProps {
  readonly layers: Results['soil']['layers'];
  readonly origin: LayerOrigin;
}

/** A resistivity of a soil as text, with the digits that its origin gives meaning to. */
export function soilResistivity(value: number, origin: LayerOrigin): string {
  switch (origin) {
    case 'stated':
    case 'from stated':
      return givenQuantity(value, 'Ω·m');
    case 'fitted':
      return fittedQuantity(value, 'Ω·m');
    case 'from fitted':
      return shortQuantity(value, 'Ω·m');
  }
}

/** A thickness in a soil as text, in the units displayed. */
function soilThickness(metres: number, origin: LayerOrigin, units: DisplayUnits): string {
  switch (origin) {
    case 'stated':
    case 'from stated':
      return quantityText('length', metres, units);
    case 'fitted':
      return fittedLength(metres, units);
    case 'from fitted':
      return shortQuantity(metres / lengthUnit(units).metres, lengthUnit(units).sign);
  }
}

/** Where the layers that the study was solved in come from. */
export function originOf({ ground }: Results): LayerOrigin {
  return ground === null ? 'stated' : 'fitted';
}

/** Layers from the surface down, without the full stop. */
export function Layers({ layers, origin }: LayersProps): VNode {
  const units = useUnits();
  const stated = (k: number, key: 'resistivity_ohm_m' | 'thickness_m'): VNode => (
    <QuantityInput
      path={['soil', 'layers', k, key]}
      kind={key === 'thickness_m' ? 'length' : 'resistivity'}
      label={key === 'thickness_m' ? `thickness of layer ${k + 1}` : `resistivity of layer ${k + 1}`}
      value={layers[k]?.[key] ?? undefined}
    />
  );
  const told = (text: string): ComponentChildren => (origin === 'fitted' ? <Result>{text}</Result> : text);
  return (
    <LayerSentence
      count={layers.length}
      resistivity={(k) =>
        origin === 'stated'
          ? stated(k, 'resistivity_ohm_m')
          : told(soilResistivity(layers[k].resistivity_ohm_m, origin))
      }
      thickness={(k) =>
        origin === 'stated'
          ? stated(k, 'thickness_m')
          : told(soilThickness(layers[k].thickness_m ?? 0, origin, units))
      }
    />
  );
}
