"""What the three scripts share: the case read from a file, clocks, the solution and the line they print."""
import json
import sys
import time

import numpy as np


class Case:
    """Segments (ends in metres, depth downward), the metal's nodes, and the images of the soil that holds the metal."""

    def __init__(self, data):
        self.p1 = np.array(data["p1"], dtype=float).reshape(-1, 3)
        self.p2 = np.array(data["p2"], dtype=float).reshape(-1, 3)
        self.radius = np.array(data["radius"], dtype=float)
        self.node1 = np.array(data["node1"], dtype=np.intp)
        self.node2 = np.array(data["node2"], dtype=np.intp)
        self.nodes = np.array(data["nodes"], dtype=float).reshape(-1, 3)
        self.factor = float(data["factor"])
        self.images = list(zip(data["weight"], data["sign"], data["offset"]))
        self.middle = (self.p1 + self.p2) / 2
        self.length = np.sqrt(((self.p2 - self.p1) ** 2).sum(axis=1))

    def __len__(self):
        return len(self.length)

    def first(self, count):
        """The same case with its first segments only, to warm up."""
        small = object.__new__(Case)
        small.__dict__.update(self.__dict__)
        for name in ("p1", "p2", "radius", "node1", "node2", "middle", "length"):
            setattr(small, name, getattr(self, name)[:count])
        return small


def blas():
    try:
        found = np.show_config(mode="dicts")["Build Dependencies"]["blas"]
        return f"{found['name']} {found['version']}"
    except (TypeError, KeyError):
        return "unknown"


def run(assemble):
    """Assembles and solves the case named on the command line; prints times and the resistance as JSON."""
    with open(sys.argv[1], encoding="utf-8") as file:
        case = Case(json.load(file))
    warm = case.first(64)
    np.linalg.solve(assemble(warm), np.ones(len(warm)))
    start, start_cpu = time.perf_counter(), time.process_time()
    matrix = assemble(case)
    middle, middle_cpu = time.perf_counter(), time.process_time()
    current = np.linalg.solve(matrix, np.ones(len(case)))
    end, end_cpu = time.perf_counter(), time.process_time()
    print(
        json.dumps(
            {
                "numpy": np.__version__,
                "blas": blas(),
                "assembly_s": middle - start,
                "assembly_cpu_s": middle_cpu - start_cpu,
                "solve_s": end - middle,
                "solve_cpu_s": end_cpu - middle_cpu,
                "resistance_ohm": 1 / current.sum(),
            }
        )
    )
