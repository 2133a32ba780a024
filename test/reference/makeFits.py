"""Fits of the runs of fit-runs.json by SciPy, with the model of titration.py.

Writes fits.json beside this file. Run by hand, with Debian's python3-scipy, after makeFitRuns.ts:

    /usr/bin/python3 test/reference/makeFits.py

Three answers for every run, as far as its errors allow:

odr            scipy.odr, orthogonal distance regression with reading and setting errors as declared. Standard
               uncertainties are those of the declared errors (cov_beta, not scaled by the residual variance).
leastSquares   scipy.optimize.least_squares on residuals divided by hypot(u_r, u_s d), d the slope of the curve at the
               measured reading, taken anew until the solution stands still; covariance from its Jacobian.
generalised    the same with the dense covariance matrix u_r^2 1 + u_s^2 diag(d^2) + u_d^2 d_i d_j min(i, j), i and j
               counting doses, whitened by its Cholesky factor.

In the last two, a point whose whole uncertainty is more than BY_VOLUME_FROM times that of its reading is compared by
volume, as the program does: its residual is d (V - the volume at which the curve passes its reading).

Before a fit is believed, the model is checked: derivatives against differences, the curve against bisection.
"""

import json
import pathlib
import sys

import numpy as np
import scipy
from scipy import odr
from scipy.linalg import solve_triangular
from scipy.optimize import least_squares

sys.dont_write_bytecode = True
from titration import Titration  # noqa: E402

HERE = pathlib.Path(__file__).parent
# Part of a standard uncertainty by which a solution may still move when the weights are taken anew.
STANDSTILL = 1e-9
BY_VOLUME_FROM = 1.2


def check_model(run):
    """Curve against bisection, derivatives and slopes against differences of fourth order."""
    free = run.free.copy()
    curve = run.curve(free)
    columns, slopes = run.derivatives()
    settled = run.y
    run.y = None
    assert np.abs(run.curve(free) - curve).max() < 1e-7, "curve and bisection disagree"
    run.y = settled

    def difference(shifted, step):
        return (8 * (shifted(step) - shifted(-step)) - (shifted(2 * step) - shifted(-2 * step))) / (12 * step)

    worst = 0
    for j, value in enumerate(free):
        step = 1e-4 * max(abs(value), 1e-3)
        column = difference(lambda s: run.curve(free + s * (np.arange(len(free)) == j)), step)
        worst = max(worst, np.abs(column - columns[:, j]).max() / np.abs(columns[:, j]).max())
    by_volume = difference(lambda s: run.curve(free, run.volumes + s), 1e-4)
    worst = max(worst, np.abs(by_volume - slopes).max() / np.abs(slopes).max())
    assert worst < 1e-5, f"derivatives and differences disagree by {worst}"
    run.curve(free)
    return worst


def with_knowledge(run, free, residuals, jacobian):
    """Appends (value - declared) / u of the known quantities."""
    rows = [(j, run.u[run.ids[j]]) for j in run.known]
    extra = np.zeros((len(rows), len(free)))
    for k, (j, u) in enumerate(rows):
        extra[k, j] = 1 / u
    return (
        np.concatenate([residuals, [(free[j] - run.declared_values[j]) / u for j, u in rows]]),
        np.vstack([jacobian, extra]),
    )


def dose_numbers(volumes):
    """Number of doses behind each point; volumes in rising order."""
    return np.cumsum(np.diff(volumes, prepend=0) > 0)


def compare(run, free, by_volume, slopes):
    """Residuals and their derivatives, not whitened."""
    residuals = run.curve(free) - run.measured
    columns, _ = run.derivatives()
    if by_volume.any():
        met, columns_there, slopes_there, _ = run.meet(by_volume)
        residuals[by_volume] = slopes[by_volume] * (run.volumes[by_volume] - met)
        columns[by_volume] = columns_there * (slopes[by_volume] / slopes_there)[:, None]
    return residuals, columns


def fit_whitened(run, noise):
    """Least squares with weights that follow the slopes; dense where doses accumulate."""
    u_r, u_s, u_d = noise
    doses = dose_numbers(run.volumes)
    together = np.minimum.outer(doses, doses)
    free = run.free.copy()
    by_volume = np.zeros(len(doses), bool)
    for _ in range(100):
        run.curve(free)
        slopes = run.slopes_at_readings()
        if by_volume.any():
            slopes[by_volume] = run.meet(by_volume)[3]
        matrix = np.diag(u_r**2 + (u_s * slopes) ** 2) + u_d**2 * np.outer(slopes, slopes) * together
        root = np.linalg.cholesky(matrix)
        by_volume = np.sqrt(np.diag(matrix)) > BY_VOLUME_FROM * u_r

        def whitened(p, root=root, by_volume=by_volume, slopes=slopes):
            pair = compare(run, p, by_volume, slopes)
            return with_knowledge(run, p, *(solve_triangular(root, part, lower=True) for part in pair))

        scale = np.linalg.norm(whitened(free)[1], axis=0)
        result = least_squares(
            lambda p: whitened(p)[0],
            free,
            lambda p: whitened(p)[1],
            method="lm",
            x_scale=1 / scale,
            ftol=1e-15,
            xtol=1e-15,
            gtol=1e-15,
        )
        assert result.success, result.message
        covariance = np.linalg.inv(result.jac.T @ result.jac)
        moved = np.abs((result.x - free) / np.sqrt(np.diag(covariance))).max()
        free = result.x
        if moved < STANDSTILL:
            return free, covariance
    raise ArithmeticError(f"weights and solution do not stand still: {moved}")


def fit_odr(run, noise):
    """Orthogonal distance regression; a known quantity is a further observation, without error in its place."""
    u_r, u_s, _ = noise
    count = len(run.volumes)
    known = run.known

    def function(p, x):
        return np.concatenate([run.curve(p, x[:count]), p[known]])

    def by_parameters(p, x):
        run.curve(p, x[:count])
        return np.vstack([run.derivatives()[0], np.eye(len(p))[known]]).T

    def by_place(p, x):
        run.curve(p, x[:count])
        return np.concatenate([run.derivatives()[1], np.zeros(len(known))])

    data = odr.Data(
        np.concatenate([run.volumes, np.zeros(len(known))]),
        np.concatenate([run.measured, run.declared_values[known]]),
        we=np.concatenate([np.full(count, u_r**-2), [run.u[run.ids[j]] ** -2 for j in known]]),
        wd=np.concatenate([np.full(count, u_s**-2), np.ones(len(known))]),
    )
    model = odr.Model(function, fjacb=by_parameters, fjacd=by_place)
    fix = np.concatenate([np.ones(count, int), np.zeros(len(known), int)])
    job = odr.ODR(data, model, beta0=run.free, ifixx=fix, maxit=500, sstol=1e-15, partol=1e-13, taufac=1)
    job.set_job(fit_type=0, deriv=2)
    output = job.run()
    assert output.info < 4, output.stopreason
    return output.beta, output.cov_beta


def main():
    document = json.loads((HERE / "fit-runs.json").read_text())
    fits = []
    for entry in document["runs"]:
        sheet = entry["sheet"]
        run = Titration(
            sheet, document["debyeHueckelA"], entry["volumes_mL"], entry["readings"], entry["truth"]
        )
        run.declared_values = run.free.copy()
        noise = sheet["reading"]["u"], sheet["burette"]["uSetting_mL"], sheet["burette"]["uDose_mL"]
        worst = check_model(run)
        answers = (
            {"generalised": fit_whitened(run, noise)}
            if noise[2] > 0
            else {"leastSquares": fit_whitened(run, noise), "odr": fit_odr(run, noise)}
        )
        fits.append({"name": entry["name"], "ids": run.ids})
        print(f"{entry['name']}: derivatives to {worst:.0e}")
        for name, (estimates, covariance) in answers.items():
            fits[-1][name] = {"estimates": estimates.tolist(), "covariance": covariance.tolist()}
            for j, identity in enumerate(run.ids):
                print(f"   {name:13} {identity:22} {estimates[j]:.7g} +- {np.sqrt(covariance[j, j]):.3g}")
    about = (
        f"Fits of the runs of fit-runs.json by SciPy {scipy.__version__}, written by makeFits.py with the model of "
        "titration.py. Estimates and covariance in the order of `ids`."
    )
    lines = [json.dumps(fit) for fit in fits]
    text = f'{{\n "about": {json.dumps(about)},\n "fits": [\n  ' + ",\n  ".join(lines) + "\n ]\n}\n"
    (HERE / "fits.json").write_text(text)


sys.exit(main())
