"""Collocation in blocks of rows; the root of a distance is taken once for a node, and images of one weight share a logarithm."""
import numpy as np
from common import run

ROWS_BYTES = 256 * 1024


def assemble(case):
    n, nodes = len(case), case.nodes
    used = np.unique(np.concatenate((case.node1, case.node2)))
    place = np.zeros(len(nodes), dtype=np.intp)
    place[used] = np.arange(len(used))
    first, second, nodes = place[case.node1], place[case.node2], nodes[used]
    if np.ptp(case.radius) != 0:
        raise SystemExit("node_shared: one radius is needed for all segments")
    groups = {}
    for weight, sign, offset in case.images:
        groups.setdefault(weight, []).append((sign, offset))
    total = np.empty((n, n))
    rows = max(1, ROWS_BYTES // (8 * n))
    plan, root = (np.empty((rows, len(nodes))) for _ in range(2))
    above, below, part, other = (np.empty((rows, n)) for _ in range(4))
    for begin in range(0, n, rows):
        middle = case.middle[begin : begin + rows]
        m = len(middle)
        flat, r, num, den, s, t = plan[:m], root[:m], above[:m], below[:m], part[:m], other[:m]
        np.subtract(middle[:, 0, None], nodes[:, 0], out=flat)
        np.multiply(flat, flat, out=flat)
        np.subtract(middle[:, 1, None], nodes[:, 1], out=r)
        np.multiply(r, r, out=r)
        flat += r
        flat += case.radius[0] ** 2
        block = total[begin : begin + m]
        block[:] = 0
        for weight, members in groups.items():
            num[:] = 1
            den[:] = 1
            for sign, offset in members:
                np.subtract(middle[:, 2, None], sign * nodes[:, 2] + offset, out=r)
                np.multiply(r, r, out=r)
                r += flat
                np.sqrt(r, out=r)
                np.take(r, first, axis=1, out=s, mode="clip")
                np.take(r, second, axis=1, out=t, mode="clip")
                s += t
                np.add(s, case.length, out=t)
                num *= t
                s -= case.length
                den *= s
            num /= den
            np.log(num, out=num)
            num *= weight
            block += num
        block *= case.factor / case.length
    return total


if __name__ == "__main__":
    run(assemble)
