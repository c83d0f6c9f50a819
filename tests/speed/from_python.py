"""Peers driven from Python: the solvers of scipy, and CVODE with its right side compiled.

Prints the same lines as the compiled peers. Arguments: repetitions, names of the workloads.
"""
import os

for threads in ("OMP_NUM_THREADS", "OPENBLAS_NUM_THREADS", "MKL_NUM_THREADS"):
    os.environ[threads] = "1"

import statistics
import sys
import time

import numba
import numpy as np
import scipy.sparse as sparse
import sksundae.cvode
from scipy.integrate import solve_ivp

import systems

TOLERANCES = (1.0, 0.3, 0.1, 0.03, 1e-2, 1e-3, 1e-4)
LATEST = 1e8


@numba.njit(cache=True)
def rate(y, out, capacity, link, film, radiation, surroundings):
    nodes = len(y)
    from_inside = 0.0
    for i in range(nodes):
        if i < nodes - 1:
            outwards = link[i] * (y[i] - y[i + 1])
        else:
            outwards = film * (y[i] - surroundings) + radiation * (y[i] ** 4 - surroundings**4)
        out[i] = (from_inside - outwards) / capacity[i]
        from_inside = outwards


class March:
    def __init__(self, system):
        self.system = system
        self.capacity, self.link = np.array(system.capacity), np.array(system.link)
        self.ends = (system.film, system.radiation, system.surroundings)
        self.start = np.full(system.nodes, system.start)

    def rates(self, t, y):
        out = np.empty_like(y)
        rate(y, out, self.capacity, self.link, *self.ends)
        return out

    def derivative(self, t, y):
        diagonal = np.zeros(len(y))
        diagonal[:-1] -= self.link
        diagonal[1:] -= self.link
        film, radiation, _ = self.ends
        diagonal[-1] -= film + 4 * radiation * y[-1] ** 3
        bands = [self.link / self.capacity[1:], diagonal / self.capacity, self.link / self.capacity[:-1]]
        return sparse.diags(bands, [-1, 0, 1], format="csc")

    def scipy(self, method, tolerance):
        def event(t, y):
            return y[0] - self.system.target

        event.terminal, event.direction = True, -1
        extra = {"lband": 1, "uband": 1} if method == "LSODA" else {"jac": self.derivative}
        found = solve_ivp(
            self.rates, (0, LATEST), self.start, method, events=event, rtol=tolerance * 1e-3, atol=tolerance, **extra
        )
        return found.t_events[0][0], len(found.t)

    def cvode(self, tolerance):
        def right_side(t, y, out):
            rate(y, out, self.capacity, self.link, *self.ends)

        def event(t, y, out):
            out[0] = y[0] - self.system.target

        event.terminal, event.direction = [True], [-1]
        solver = sksundae.cvode.CVODE(
            right_side, method="BDF", linsolver="band", lband=1, uband=1, rtol=max(tolerance * 1e-3, 1e-12),
            atol=tolerance, eventsfn=event, num_events=1, max_num_steps=100_000,
        )
        found = solver.solve(np.array([0.0, LATEST]), self.start)
        return float(np.ravel(found.t_events)[0]), 0


METHODS = {
    "cvode-band": lambda march, tolerance: march.cvode(tolerance),
    "scipy-LSODA": lambda march, tolerance: march.scipy("LSODA", tolerance),
    "scipy-Radau": lambda march, tolerance: march.scipy("Radau", tolerance),
    "scipy-BDF": lambda march, tolerance: march.scipy("BDF", tolerance),
}


def main():
    repetitions, names = int(sys.argv[1]), sys.argv[2:]
    for name in names:
        for mesh in systems.MESHES[name]:
            march = March(systems.System(name, mesh))
            for method, run in METHODS.items():
                for tolerance in TOLERANCES:
                    times = []
                    for _ in range(repetitions):
                        begin = time.process_time()
                        answer, steps = run(march, tolerance)
                        times.append(time.process_time() - begin)
                    cost = statistics.median(times) * 1e3
                    print(name, march.system.nodes, method, tolerance, repr(float(answer)), steps, f"{cost:.6f}", flush=True)


main()
