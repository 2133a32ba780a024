"""Quantiles of Student's t, F and chi-square from SciPy.

Writes quantiles.json beside this file. Run by hand, with Debian's python3-scipy:

    /usr/bin/python3 test/reference/makeQuantiles.py

SciPy inverts the distributions by its own code (Cephes and Boost), not by the library that the project uses.
Every quantile is checked before it is written: a Newton step on SciPy's distribution function, taken from the smaller
tail, must not move it by more than a part in 1e10; where it would, the step is taken.
"""

import itertools
import json
import math
import pathlib

import scipy
from scipy import stats

INFINITE = float("inf")
PROBABILITIES = [1e-6, 0.001, 0.025, 0.05, 0.16, 0.5, 0.5001, 0.6827, 0.9, 0.95, 0.975, 0.99, 0.9973, 0.999]
DEGREES = [0.5, 1, 1.5, 2, 2.5, 3, 4.2, 7, 10, 30, 47.3, 95, 300, 2500, 1e4, 1e6]
FIRST_DEGREES = [1, 2, 2.5, 3, 5, 8, 30, 1e4, INFINITE]
# Part of itself by which a quantile may still move.
STANDSTILL = 1e-10
# No one asks for an F ratio beyond this.
LARGEST = 1e10


def f_distribution(above, below):
    """F, and its limits for infinitely many degrees of freedom on one side."""
    if math.isinf(above):
        return stats.invgamma(below / 2, scale=below / 2)
    return stats.chi2(above, scale=1 / above) if math.isinf(below) else stats.f(above, below)


def mend(distribution, probability, quantile):
    """Newton's method on the distribution function, from the tail that is smaller."""
    lower = probability <= 0.5
    wanted = probability if lower else 1 - probability
    for _ in range(20):
        miss = distribution.cdf(quantile) - wanted if lower else wanted - distribution.sf(quantile)
        step = -miss / distribution.pdf(quantile)
        if abs(step) <= STANDSTILL * abs(quantile):
            return quantile
        quantile += step
    raise ArithmeticError(f"{distribution.args} at {probability}: no standstill at {quantile}")


def entry(distribution, probability, degrees):
    """One row of the file."""
    quantile = mend(distribution, probability, float(distribution.ppf(probability)))
    return [probability, *("Infinity" if math.isinf(number) else number for number in degrees), quantile]


def main():
    t = [
        entry(stats.norm() if math.isinf(d) else stats.t(d), p, [d])
        for p, d in itertools.product(PROBABILITIES, [*DEGREES, INFINITE])
        if p != 0.5
    ]
    chi_square = [entry(stats.chi2(d), p, [d]) for p, d in itertools.product(PROBABILITIES, DEGREES)]
    f = [
        entry(f_distribution(above, below), p, [above, below])
        for p, above, below in itertools.product(PROBABILITIES, FIRST_DEGREES, [*DEGREES, INFINITE])
        if math.isfinite(above) or math.isfinite(below)
    ]
    tables = {"t": t, "chiSquare": chi_square, "f": [row for row in f if row[-1] < LARGEST]}
    about = (
        f"Quantiles from SciPy {scipy.__version__}, written by makeQuantiles.py. Each row: probability, degrees of "
        "freedom (two for F), quantile."
    )
    parts = [
        f'  "{name}": [\n' + ",\n".join(f"    {json.dumps(row)}" for row in rows) + "\n  ]"
        for name, rows in tables.items()
    ]
    path = pathlib.Path(__file__).with_name("quantiles.json")
    path.write_text(f'{{\n  "about": {json.dumps(about)},\n' + ",\n".join(parts) + "\n}\n")
    print(", ".join(f"{name}: {len(rows)}" for name, rows in tables.items()))


main()
