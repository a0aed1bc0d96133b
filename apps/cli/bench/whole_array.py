"""Collocation on whole arrays, the shortest script: every image adds ln((r1 + r2 + L)/(r1 + r2 - L)) over n x n."""
import numpy as np
from common import run


def plan(case, ends):
    dx = case.middle[:, 0, None] - ends[:, 0]
    dy = case.middle[:, 1, None] - ends[:, 1]
    return dx**2 + dy**2 + case.radius**2


def assemble(case):
    plan1, plan2 = plan(case, case.p1), plan(case, case.p2)
    total = np.zeros((len(case), len(case)))
    for weight, sign, offset in case.images:
        r1 = np.sqrt(plan1 + (case.middle[:, 2, None] - (sign * case.p1[:, 2] + offset)) ** 2)
        r2 = np.sqrt(plan2 + (case.middle[:, 2, None] - (sign * case.p2[:, 2] + offset)) ** 2)
        total += weight * np.log((r1 + r2 + case.length) / (r1 + r2 - case.length))
    return case.factor * total / case.length


if __name__ == "__main__":
    run(assemble)
