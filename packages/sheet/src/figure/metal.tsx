// Draws the metal of a plan as ink: conductors, rods, floating metal, places of injection.
import type { Outcome, PlanConductor, Point } from '@ohmstead/study';
import type { VNode } from 'preact';
import type { Plate } from '../geometry/plate.ts';
import { Path } from './drawn.tsx';
import { piecesPath, px } from './path.ts';

/** Radius of a rod's ring, drawing units. */
export const ROD_RADIUS = 3.8;

function pieces(conductors: readonly PlanConductor[]): readonly (readonly [Point, Point])[] {
  return conductors.map((c): readonly [Point, Point] => [
    [c.x1, c.y1],
    [c.x2, c.y2],
  ]);
}

/** Conductors as lines in drawing units. */
export function metalLines(
  plate: Plate,
  conductors: readonly PlanConductor[],
): readonly (readonly [Point, Point])[] {
  return pieces(conductors).map(([a, b]): readonly [Point, Point] => [
    [plate.x(a[0]), plate.y(a[1])],
    [plate.x(b[0]), plate.y(b[1])],
  ]);
}

/** Class of line for a conductor. */
function styleOf(c: PlanConductor): 'joined' | 'insulated' | 'floating' {
  if (c.role === 'floating') return 'floating';
  return c.insulated ? 'insulated' : 'joined';
}

/** Conductors and rods; a pale casing keeps them legible on a dark fill. */
export function Metal({
  plate,
  conductors,
  small,
}: {
  plate: Plate;
  conductors: readonly PlanConductor[];
  small?: boolean;
}): VNode {
  const lines = conductors.filter((c) => !c.rod);
  const path = (style: ReturnType<typeof styleOf>): string =>
    piecesPath(plate, pieces(lines.filter((c) => styleOf(c) === style)));
  const drawn = { joined: path('joined'), insulated: path('insulated'), floating: path('floating') };
  const radius = small === true ? ROD_RADIUS * 0.72 : ROD_RADIUS;
  return (
    <g>
      <Path class="casing" d={drawn.joined + drawn.insulated + drawn.floating} />
      {drawn.joined !== '' && <Path class="metal" d={drawn.joined} />}
      {drawn.insulated !== '' && <Path class="metal insulated" d={drawn.insulated} />}
      {drawn.floating !== '' && <Path class="metal floating" d={drawn.floating} />}
      {conductors
        .filter((c) => c.rod)
        .map((c) => (
          <Rod key={c.id} x={plate.x(c.x1)} y={plate.y(c.y1)} radius={radius} />
        ))}
    </g>
  );
}

/** Ring with a dot. */
export function Rod({ x, y, radius = ROD_RADIUS }: { x: number; y: number; radius?: number }): VNode {
  return (
    <g>
      <circle class="rod" cx={px(x)} cy={px(y)} r={px(radius)} />
      <circle class="dot" cx={px(x)} cy={px(y)} r={px(radius * 0.34)} />
    </g>
  );
}

/** Lozenge where current enters the metal. */
export function Injection({ x, y }: { x: number; y: number }): VNode {
  return <Path class="inject" d={`M${px(x)},${px(y - 6)}l6,6l-6,6l-6,-6Z`} />;
}

/** Distinct places of injection with the cases that use them, in order of the cases. */
export function injections(
  outcome: Outcome,
): readonly { readonly x: number; readonly y: number; readonly names: readonly string[] }[] {
  const places = new Map<string, { x: number; y: number; names: string[] }>();
  for (const { name, inject } of outcome.results.cases) {
    const key = `${inject.x_m} ${inject.y_m}`;
    const known = places.get(key);
    if (known === undefined) places.set(key, { x: inject.x_m, y: inject.y_m, names: [name] });
    else known.names.push(name);
  }
  return [...places.values()];
}
