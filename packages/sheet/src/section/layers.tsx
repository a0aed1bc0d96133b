// Tells the layers of a soil as part of a sentence.
import type { Results } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import { fittedQuantity, shortQuantity } from '../format/fitted.ts';
import { givenQuantity } from '../format/number.ts';
import { capital, countWord } from '../format/words.ts';
import { Input, Result } from './parts.tsx';

/** Where layers come from: stated in the study, fitted to readings, or following from either in another season. */
export type LayerOrigin = 'stated' | 'fitted' | 'from stated' | 'from fitted';

export interface LayersProps {
  readonly layers: Results['soil']['layers'];
  readonly origin: LayerOrigin;
}

/** A quantity of a soil as text, with the digits that its origin gives meaning to. */
export function soilQuantity(value: number, unit: string, origin: LayerOrigin): string {
  switch (origin) {
    case 'stated':
    case 'from stated':
      return givenQuantity(value, unit);
    case 'fitted':
      return fittedQuantity(value, unit);
    case 'from fitted':
      return shortQuantity(value, unit);
  }
}

/** Where the layers that the study was solved in come from. */
export function originOf({ ground }: Results): LayerOrigin {
  return ground === null ? 'stated' : 'fitted';
}

/** Layers from the surface down, without the full stop. */
export function Layers({ layers, origin }: LayersProps): VNode {
  const told = (value: number, unit: string, of: string): ComponentChildren => {
    if (origin === 'stated') return <Input path={`soil.layers${of}`} value={value} unit={unit} />;
    const text = soilQuantity(value, unit, origin);
    return origin === 'fitted' ? <Result>{text}</Result> : text;
  };
  if (layers.length === 1) {
    return (
      <>
        The soil is taken as uniform, {told(layers[0].resistivity_ohm_m, 'Ω·m', '[0].resistivity_ohm_m')} at
        every depth
      </>
    );
  }
  return (
    <>
      {capital(countWord(layers.length))} layers:{' '}
      {layers.map((layer, k) => (
        <span key={k}>
          {k > 0 && ', then '}
          {told(layer.resistivity_ohm_m, 'Ω·m', `[${k}].resistivity_ohm_m`)}
          {layer.thickness_m === null ? (
            ' below'
          ) : (
            <>
              {k === 0 ? ' for the first ' : ' for '}
              {told(layer.thickness_m, 'm', `[${k}].thickness_m`)}
            </>
          )}
        </span>
      ))}
    </>
  );
}
