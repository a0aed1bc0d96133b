// The ratios below which a run fails: in one process, against what the same minute gives, with room for a busy machine.

export interface Gate {
  readonly name: string;
  readonly found: number;
  /** what an idle machine shows */
  readonly usual: number;
}

/** A gate fails only below the usual ratio over this: arms in turns still differ so much on a shared machine. */
export const SLACK = 1.5;

export function passes({ found, usual }: Gate): boolean {
  return found >= usual / SLACK;
}

export function gateLine(gate: Gate): string {
  const { name, found, usual } = gate;
  const least = (usual / SLACK).toFixed(2);
  return `${passes(gate) ? 'passed' : 'FAILED'}: ${name} ${found.toFixed(2)}, at least ${least} (usual ${usual.toFixed(2)} over ${SLACK})`;
}
