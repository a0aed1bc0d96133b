// Trust: what was checked, how the answer moved with the mesh, and what the uncertainty means.
import type { Outcome, Results } from '@ohmstead/study';
import type { VNode } from 'preact';
import { percent, powerOfTen, significant } from '../format/number.ts';
import { tally } from '../format/words.ts';
import { S } from './formulas.tsx';
import { How } from './how.tsx';
import { Part } from './part.tsx';
import { DataTable, Result, Say } from './parts.tsx';

/** Current that may be missing at remote earth, of the current injected; far above rounding, far below any result's digits. */
const BALANCE_TOLERANCE = 1e-6;
/** Residual of the leakage equations that may be left, relative; below it no shown digit moves. */
const RESIDUAL_TOLERANCE = 1e-6;
/** Error of the soil's images below which no shown digit moves, of the kernel's scale. */
const IMAGE_TOLERANCE = 1e-3;

function Balance({ checks }: { checks: Results['checks'] }): VNode {
  const size = Math.abs(checks.current_balance);
  const closes = size <= BALANCE_TOLERANCE;
  return (
    <Say>
      {closes
        ? 'The current that arrives at remote earth equals the current injected to '
        : 'The current that arrives at remote earth differs from the current injected by '}
      <Result>{powerOfTen(size)}</Result> of it.
      {!closes && ' The balance does not close, and no figure of this sheet may be relied on.'}
      <How
        of="the balance is checked"
        formula={
          <>
            (Σ
            <S of="I" index="leak" /> − <S of="I" index="injected" />
            )/
            <S of="I" index="injected" />
          </>
        }
        clause="The potentials of reference are chosen so that this holds; what is missing is rounding. Whether the solution solves the equations is told by the two checks below."
        inputs={[{ symbol: <>Σ</>, name: 'over every segment of every electrode', value: 'signed' }]}
        value={powerOfTen(checks.current_balance)}
      />
    </Say>
  );
}

function Equations({ checks }: { checks: Results['checks'] }): VNode {
  const met = checks.residual <= RESIDUAL_TOLERANCE;
  const images = checks.image_error <= IMAGE_TOLERANCE;
  return (
    <>
      <Say>
        The leakage equations are met to <Result>{powerOfTen(checks.residual)}</Result>
        {checks.solver_iterations > 0 ? ` after ${checks.solver_iterations} iterations` : ''}
        {met ? '' : ', which is too coarse to rely on'}; at the worst node of the metal the currents sum to{' '}
        <Result>{powerOfTen(Math.abs(checks.node_balance))}</Result> of the current injected
        {Math.abs(checks.node_balance) <= BALANCE_TOLERANCE ? '.' : ', which is too much to rely on.'}
      </Say>
      <Say>
        {checks.image_error === 0
          ? `The soil is represented exactly, by ${checks.image_count} images.`
          : `The soil is represented by ${checks.image_count} images, which stay within ${powerOfTen(checks.image_error)} of its exact layer kernel`}
        {checks.image_error !== 0 && (images ? '.' : ': too coarse to rely on.')}
      </Say>
    </>
  );
}

function moved(now: number, before: number): string {
  return now === before ? 'not at all' : `by ${percent(Math.abs(now / before - 1))}`;
}

function Mesh({ mesh }: { mesh: Results['mesh'] }): VNode {
  const last = mesh[mesh.length - 1];
  const before = mesh[mesh.length - 2];
  return (
    <>
      <Say>
        {before === undefined
          ? 'One mesh was solved; how the answer moves with the mesh is not known from it.'
          : `From ${before.segment_count} to ${last.segment_count} segments the resistance moved ${moved(last.resistance_ohm, before.resistance_ohm)}, the worst touch voltage ${moved(last.worst_touch_ratio, before.worst_touch_ratio)} and the worst step voltage ${moved(last.worst_step_ratio, before.worst_step_ratio)}.`}
      </Say>
      {mesh.length > 0 && (
        <DataTable
          caption="How the answer moved with the mesh"
          columns={[
            { label: 'mesh' },
            { label: 'segments', align: 'right' },
            { label: 'resistance, Ω', align: 'right' },
            { label: 'worst touch, of the rise', align: 'right' },
            { label: 'worst step, of the rise', align: 'right' },
          ]}
          rows={mesh.map((level, k) => [
            String(k + 1),
            String(level.segment_count),
            significant(level.resistance_ohm, 5),
            significant(level.worst_touch_ratio, 4),
            significant(level.worst_step_ratio, 4),
          ])}
          file="mesh.csv"
        />
      )}
    </>
  );
}

/** Checks, mesh, uncertainty. */
export function Trust({ outcome }: { outcome: Outcome }): VNode {
  const { checks, mesh, ground } = outcome.results;
  const facts = [
    `balance ${powerOfTen(Math.abs(checks.current_balance))}`,
    `residual ${powerOfTen(checks.residual)}`,
    tally(mesh.length, 'mesh', 'meshes'),
  ];
  return (
    <Part id="trust" title="Trust" facts={facts} outcome={outcome}>
      <Balance checks={checks} />
      <Equations checks={checks} />
      <Mesh mesh={mesh} />
      <Say>
        The ± behind a result is numerical: it is estimated from how the result moved from mesh to mesh, and
        rounded up. It says nothing of the soil readings, the season, the fault current or the state of the
        joints, which commonly weigh more. Where a margin is smaller than the ±, the sheet says that it cannot
        be decided at this mesh.
        {ground !== null &&
          ' What the soil readings leave open is told apart, as 5–95\u202f% of the soils, under Ground, Rise and People.'}
      </Say>
    </Part>
  );
}
