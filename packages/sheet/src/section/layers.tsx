// Tells the layers of a soil as part of a sentence.
import type { Results } from '@ohmstead/study';
import type { ComponentChildren, VNode } from 'preact';
import { givenQuantity } from '../format/number.ts';
import { capital, countWord } from '../format/words.ts';
import { Input } from './parts.tsx';

export interface LayersProps {
  readonly layers: Results['soil']['layers'];
  /** place in study.json where the layers are inputs; without it they are told as what follows from inputs */
  readonly path?: string;
}

/** Layers from the surface down, without the full stop. */
export function Layers({ layers, path }: LayersProps): VNode {
  const told = (value: number, unit: string, of: string): ComponentChildren =>
    path === undefined ? (
      givenQuantity(value, unit)
    ) : (
      <Input path={`${path}${of}`} value={value} unit={unit} />
    );
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
