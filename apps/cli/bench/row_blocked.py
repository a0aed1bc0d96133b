"""Collocation in blocks of rows that stay in the cache, every operation in place."""
import numpy as np
from common import run

ROWS_BYTES = 256 * 1024


def assemble(case):
    n = len(case)
    total = np.empty((n, n))
    rows = max(1, ROWS_BYTES // (8 * n))
    plan1, plan2, r1, r2, part = (np.empty((rows, n)) for _ in range(5))
    squared = case.radius**2
    for begin in range(0, n, rows):
        middle = case.middle[begin : begin + rows]
        m = len(middle)
        p1, p2, a, b, c = plan1[:m], plan2[:m], r1[:m], r2[:m], part[:m]
        for plan, ends in ((p1, case.p1), (p2, case.p2)):
            np.subtract(middle[:, 0, None], ends[:, 0], out=plan)
            np.multiply(plan, plan, out=plan)
            np.subtract(middle[:, 1, None], ends[:, 1], out=c)
            np.multiply(c, c, out=c)
            plan += c
            plan += squared
        block = total[begin : begin + m]
        block[:] = 0
        for weight, sign, offset in case.images:
            for into, plan, ends in ((a, p1, case.p1), (b, p2, case.p2)):
                np.subtract(middle[:, 2, None], sign * ends[:, 2] + offset, out=into)
                np.multiply(into, into, out=into)
                into += plan
                np.sqrt(into, out=into)
            a += b
            np.add(a, case.length, out=b)
            a -= case.length
            b /= a
            np.log(b, out=b)
            b *= weight
            block += b
        block *= case.factor / case.length
    return total


if __name__ == "__main__":
    run(assemble)
