// The formulas behind the results, set as text, each with the clause it comes from.
import type { VNode } from 'preact';

/** Symbol with an index. */
export function S({ of, index }: { of: string; index?: string }): VNode {
  return (
    <span class="sym">
      <i>{of}</i>
      {index !== undefined && <sub>{index}</sub>}
    </span>
  );
}

/** Clauses of IEEE Std 80-2013; recalled, not read beside the standard. */
export const CLAUSES = {
  covering: 'IEEE Std 80-2013, clause 7.4, eq. 27 (clause from memory)',
  tolerable: 'IEEE Std 80-2013, clauses 8.3–8.4, eq. 29–33 (clause from memory)',
  decrement: 'IEEE Std 80-2013, clause 15.10, eq. 79 (clause from memory)',
  gridCurrent: 'IEEE Std 80-2013, clause 15.1 (clause from memory)',
} as const;

/** Current factor of the tolerable voltages, A·√s, by body mass: IEEE Std 80-2013, clause 8.4 (from memory). */
export const BODY_FACTOR: Readonly<Record<50 | 70, number>> = { 50: 0.116, 70: 0.157 };

export function GridCurrentFormula(): VNode {
  return (
    <>
      <S of="I" index="G" /> = <S of="D" index="f" />·<S of="S" index="f" />·<S of="I" index="f" />
    </>
  );
}

export function DecrementFormula(): VNode {
  return (
    <>
      <S of="D" index="f" /> = √(1 + (<S of="T" index="a" />/<S of="t" index="f" />
      )(1 − e
      <sup>
        −2<i>t</i>/<i>T</i>
      </sup>
      )), <S of="T" index="a" /> = (<i>X</i>/<i>R</i>)/(2π<i>f</i>)
    </>
  );
}

export function RiseFormula(): VNode {
  return (
    <>
      GPR = <S of="R" />·<S of="I" index="G" />
    </>
  );
}

export function CoveringFormula(): VNode {
  return (
    <>
      <S of="C" index="s" /> = 1 − 0.09 (1 − <i>ρ</i>/<S of="ρ" index="s" />
      )/(2
      <S of="h" index="s" /> + 0.09)
    </>
  );
}

export function TouchFormula({ factor }: { factor: number }): VNode {
  return (
    <>
      <S of="E" index="touch" /> = (1000 + 1.5 <S of="C" index="s" />
      <S of="ρ" index="s" />
      )·{factor}/√
      <S of="t" index="s" />
    </>
  );
}

export function StepFormula({ factor }: { factor: number }): VNode {
  return (
    <>
      <S of="E" index="step" /> = (1000 + 6 <S of="C" index="s" />
      <S of="ρ" index="s" />
      )·{factor}/√
      <S of="t" index="s" />
    </>
  );
}
