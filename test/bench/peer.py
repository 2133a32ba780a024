"""The fit of the benchmark by SciPy: scipy.optimize.least_squares with exact derivatives, vectorised over the points.

    /usr/bin/python3 test/bench/peer.py PROBLEM.json

The problem is written by peerBench.ts: sheet, coefficient, volumes, readings, start, the program's final standard
uncertainties of the residuals, and the number of repetitions. Two jobs are timed with either of SciPy's methods:

once    one minimisation with the final weights given: less than the program does
whole   weights hypot(u_r, u_s d) from the slopes of the data, then from those of the curve at the readings, until the
        solution stands still to 1e-4 of its standard uncertainties, as the program does

Prints one JSON document: times in ms, counts of evaluations, the solution.
"""

import json
import pathlib
import sys
import time

import numpy as np
from scipy.optimize import least_squares

sys.dont_write_bytecode = True
sys.path.insert(0, str(pathlib.Path(__file__).parent.parent / "reference"))
from titration import Titration  # noqa: E402


def main():
    problem = json.loads(pathlib.Path(sys.argv[1]).read_text())
    starts = dict(zip(problem["ids"], problem["start"]))
    run = Titration(
        problem["sheet"], problem["debyeHueckelA"], problem["volumes_mL"], problem["readings"], starts
    )
    start = run.free.copy()
    u_r, u_s = problem["sheet"]["reading"]["u"], problem["sheet"]["burette"]["uSetting_mL"]
    final = np.array(problem["sigma"])
    first = np.hypot(u_r, u_s * np.gradient(run.measured, run.volumes))
    counts = {}
    asked, sigma = None, final

    def residuals(p):
        nonlocal asked
        counts["curves"] += 1
        predicted = run.curve(p)
        counts["searches"] += run.searched
        counts["newtonRounds"] += run.rounds
        asked = p.copy()
        return (predicted - run.measured) / sigma

    def jacobian(p):
        counts["derivatives"] += 1
        if not np.array_equal(p, asked):
            residuals(p)
        return run.derivatives()[0] / sigma[:, None]

    def minimise(p, method, tolerance):
        return least_squares(residuals, p, jacobian, method=method, x_scale="jac", ftol=tolerance, xtol=tolerance)

    def begin():
        counts.update(curves=0, derivatives=0, newtonRounds=0, searches=0)
        run.take(start)
        # As the program does: the first solution of every point is sought from its reading.
        run.start_from_readings()

    def once(method):
        nonlocal sigma
        begin()
        sigma = final
        return minimise(start, method, 1e-8)

    def whole(method):
        nonlocal sigma
        begin()
        sigma, p = first, start
        for tolerance in [1e-5] + [1e-8] * 30:
            result = minimise(p, method, tolerance)
            spread = np.sqrt(np.diag(np.linalg.inv(result.jac.T @ result.jac)))
            moved = np.abs((result.x - p) / spread).max()
            p = result.x
            if moved < 1e-4:
                break
            sigma = np.hypot(u_r, u_s * run.slopes_at_readings())
        return result

    answers = []
    for job in (once, whole):
        for method in ("lm", "trf"):
            times = []
            for _ in range(problem["repetitions"] + 1):
                before = time.perf_counter()
                result = job(method)
                times.append(1000 * (time.perf_counter() - before))
            times = sorted(times[1:])
            answers.append(
                {
                    "job": job.__name__,
                    "method": method,
                    "median": times[len(times) // 2],
                    "fastest": times[0],
                    "slowest": times[-1],
                    **counts,
                    "success": bool(result.success),
                    "parameters": dict(zip(run.ids, result.x)),
                }
            )
    print(json.dumps(answers))


main()
