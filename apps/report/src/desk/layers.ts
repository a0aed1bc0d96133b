// Layers of soil added, removed and moved, so that every layer but the last one keeps a thickness.
import { isObject, type JsonObject, type JsonValue } from '@ohmstead/study';
import type { Draft } from './draft.ts';
import type { JsonPath } from './path.ts';
import { listAt, setList } from './set-value.ts';

/** Thickness given to the upper part of a split last layer where no layer above has one, m. Reason: a round length. */
const FIRST_THICKNESS_M = 1;

function objects(draft: Draft, path: JsonPath): readonly JsonObject[] {
  return listAt(draft, path).map((layer) => (isObject(layer) ? layer : {}));
}

function without(layer: JsonObject, key: string): JsonObject {
  return Object.fromEntries(Object.entries(layer).filter(([name]) => name !== key));
}

function thicknessOf(layer: JsonObject | undefined): number | undefined {
  const thickness = layer?.thickness_m;
  return typeof thickness === 'number' && thickness > 0 ? thickness : undefined;
}

/**
 * Splits a layer in two of the same resistivity: the ground is the same as before until one of them is changed.
 * @param path of the list, e.g. `['soil', 'layers']`
 * @param at the layer: its thickness is halved; from the last one a layer as thick as the one above it is cut
 * @returns the draft; with no such layer a first layer is begun, its resistivity to be told
 */
export function splitLayer(draft: Draft, path: JsonPath, at: number): Draft {
  const layers = objects(draft, path);
  const layer = layers[at];
  if (layer === undefined) return setList(draft, path, [...layers, {}]);
  if (at < layers.length - 1) {
    const thickness = thicknessOf(layer);
    const half = thickness === undefined ? layer : { ...layer, thickness_m: thickness / 2 };
    return setList(draft, path, layers.toSpliced(at, 1, half, half));
  }
  const cut = { ...layer, thickness_m: thicknessOf(layers[at - 1]) ?? FIRST_THICKNESS_M };
  return setList(draft, path, layers.toSpliced(at, 1, cut, without(layer, 'thickness_m')));
}

/** Removes a layer; with the last one gone, the layer above it has no bottom any more. */
export function removeLayer(draft: Draft, path: JsonPath, at: number): Draft {
  const left = objects(draft, path).toSpliced(at, 1);
  return setList(draft, path, bottomless(left));
}

/** Moves a layer; the one that comes to lie last gives its thickness to the one that lay there before. */
export function moveLayer(draft: Draft, path: JsonPath, from: number, to: number): Draft {
  const layers = objects(draft, path);
  const layer = layers[from];
  if (layer === undefined || to < 0 || to >= layers.length || from === to) return draft;
  const moved = layers.toSpliced(from, 1).toSpliced(to, 0, layer);
  const given = moved.at(-1)?.thickness_m;
  const whole = moved.map((one): JsonObject => {
    return given !== undefined && one.thickness_m === undefined ? { ...one, thickness_m: given } : one;
  });
  return setList(draft, path, bottomless(whole));
}

function bottomless(layers: readonly JsonObject[]): readonly JsonValue[] {
  return layers.map((layer, i) => (i === layers.length - 1 ? without(layer, 'thickness_m') : layer));
}
