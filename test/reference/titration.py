"""A titration curve with exact derivatives, vectorised over its points: a second formulation of the model.

Written for the comparisons with SciPy, from the equations alone. Unlike the program, it works with the activity a of H+
(y = ln a) and the net charge as it stands, keeps strong ions as net charge and total, and finds derivatives by the
adjoint of the two equations. Reads the sheets of the program, as far as the runs of the comparisons need them.

Forms of a system with charge z0 - k, k protons lost, stand as f_k ~ beta_k a^-k exp((z_k^2 - z_0^2) L), with
ln gamma_z = -z^2 L and L = A ln10 (sqrt I / (1 + sqrt I) - 0.3 I) by Davies, 0 without. Per point two equations:

    F = S + sum C zbar + [H] - [OH] = 0        G = I - (T + sum C z2bar + [H] + [OH]) / 2 = 0

with S and T the net charge and the total of the strong ions, [H] = a e^L and [OH] = Kw e^L / a.
"""

import numpy as np

LN10 = np.log(10)
GAS_CONSTANT = 8.31446261815324
FARADAY_CONSTANT = 96485.33212331
CATIONS_PER_CARBONATE = {"hydroxide": 2, "toHydrogencarbonate": 1, "totalBase": 0}


def declared(entry, start):
    """(value, u, state) of an entry of a sheet; fitted entries begin at `start`."""
    if entry == "fitted":
        return start, None, "fitted"
    if isinstance(entry, dict):
        return entry["value"], entry["u"], "known"
    return entry, None, "fixed"


class System:
    def __init__(self, pka_ids, z0):
        self.pka_ids = pka_ids
        self.lost = np.arange(len(pka_ids) + 1.0)[:, None]
        self.z = z0 - self.lost
        self.z2 = self.z**2
        self.raised = self.z2 - z0**2


class Titration:
    """One run. `ids` are its free quantities, fitted and known; `free` their values to begin with."""

    def __init__(self, sheet, coefficient_a, volumes, readings, starts):
        self.volumes = np.asarray(volumes, float)
        self.measured = np.asarray(readings, float)
        self.values, self.u, self.states = {}, {}, {}
        self.systems, self.amounts = [], []
        medium, reading, sample, titrant = sheet["medium"], sheet["reading"], sheet["sample"], sheet["titrant"]
        self.a_ln10 = coefficient_a * LN10 if medium["activity"] == "davies" else 0.0
        self.shows_activity = reading["scale"] == "activity"
        self.is_potential = reading["kind"] == "mV"
        kelvin = medium["temperature_C"] + 273.15
        self.nernst = 1000 * GAS_CONSTANT * kelvin * LN10 / FARADAY_CONSTANT

        def add(name, entry):
            self.values[name], self.u[name], self.states[name] = declared(entry, starts.get(name))

        def present(entry):
            return entry != 0

        for number, analyte in enumerate(sample["analytes"]):
            prefix = "" if number == 0 else f"analyte{number + 1}."
            names = [f"{prefix}pKa{k + 1}" for k in range(analyte["groups"])]
            for k, name in enumerate(names):
                add(name, analyte["pKa"][k] if "pKa" in analyte else "fitted")
            counter = analyte["protonsLostAsWeighed"] - analyte["chargeFullyProtonated"]
            self.systems.append(System(names, analyte["chargeFullyProtonated"]))
            add(f"{prefix}concentration", analyte.get("concentration_M", "fitted"))
            self.amounts.append((f"{prefix}concentration", "sample", counter, abs(counter), len(self.systems) - 1))
        carbonate = None
        if present(sample["carbonate_M"]) or present(titrant["carbonate_M"]):
            names = ["carbonate.pKa1", "carbonate.pKa2"]
            for k, name in enumerate(names):
                add(name, medium["carbonicPKa"][k])
            self.systems.append(System(names, 0))
            carbonate = len(self.systems) - 1
        for vessel, contents in (("sample", sample), ("titrant", titrant)):
            meaning = "hydroxide" if vessel == "sample" or titrant["kind"] == "acid" else titrant.get("strengthMeans", "hydroxide")
            cations = CATIONS_PER_CARBONATE[meaning]
            add(f"{vessel}.background", contents["background_M"])
            self.amounts.append((f"{vessel}.background", vessel, 0, 2, None))
            if carbonate is not None:
                add(f"{vessel}.carbonate", contents["carbonate_M"])
                self.amounts.append((f"{vessel}.carbonate", vessel, cations, cations, carbonate))
        add("sample.strongIon", sample["strongIon_M"])
        self.amounts.append(("sample.strongIon", "sample", 1, None, None))
        add("titrant.concentration", titrant["concentration_M"])
        sign = -1 if titrant["kind"] == "acid" else 1
        self.amounts.append(("titrant.concentration", "titrant", sign, 1, None))
        add("sample.volume", sample["volume_mL"])
        add("sample.extraWater", sample["extraWater_mL"])
        add("medium.pKw", medium["pKw"])
        add("burette.gain", sheet["burette"]["gain"])
        self.zero = "reading.E0" if self.is_potential else "reading.offset"
        add(self.zero, reading["E0_mV"] if self.is_potential else reading["offset"])
        add("reading.slope", reading["slope"])

        self.ids = [name for name, state in self.states.items() if state != "fixed"]
        self.free = np.array([self.values[name] for name in self.ids])
        self.known = [j for j, name in enumerate(self.ids) if self.states[name] == "known"]
        # Solutions to start the next ones from, and how many rounds of Newton's method the last curve took.
        self.y = self.ionic = None
        self.rounds = 0

    # -- the mixture ---------------------------------------------------------------------------------------------

    def take(self, free):
        for name, value in zip(self.ids, free):
            self.values[name] = value

    def vessel(self, which):
        """Strong net charge, strong total, and the systems of one vessel, mol/L."""
        contents = np.zeros(2 + len(self.systems))
        for name, vessel, net, total, system in self.amounts:
            if vessel == which:
                contents += self.values[name] * self.brings(name, net, total, system)
        return contents

    def brings(self, name, net, total, system):
        """What one mol of an amount brings."""
        direction = np.zeros(2 + len(self.systems))
        direction[0] = net
        direction[1] = (1 if self.values[name] >= 0 else -1) if total is None else total
        if system is not None:
            direction[2 + system] = 1
        return direction

    def mix(self, volumes):
        """True volumes of the titrant and total volumes in mL, and the mixture, one column per point."""
        self.contents = {which: self.vessel(which) for which in ("sample", "titrant")}
        true = self.values["burette.gain"] * volumes
        total = self.values["sample.volume"] + self.values["sample.extraWater"] + true
        mixture = self.contents["sample"][:, None] * (self.values["sample.volume"] / total)
        mixture += self.contents["titrant"][:, None] * (true / total)
        return true, total, mixture

    # -- the two equations ---------------------------------------------------------------------------------------

    def davies(self, ionic):
        if self.a_ln10 == 0:
            return 0.0, 0.0
        root = np.sqrt(ionic)
        return (
            self.a_ln10 * (root / (1 + root) - 0.3 * ionic),
            self.a_ln10 * (0.5 / (root * (1 + root) ** 2) - 0.3),
        )

    def equations(self, mixture, y, ionic):
        """F, G and their derivatives by y and I; keeps what the derivatives by quantities need."""
        l, l_slope = self.davies(ionic)
        h = np.exp(y + l)
        oh = np.exp(l - y - self.values["medium.pKw"] * LN10)
        f = mixture[0] + h - oh
        g = ionic - 0.5 * (mixture[1] + h + oh)
        f_y, f_l = h + oh, h - oh
        g_y, g_l = -0.5 * (h - oh), -0.5 * (h + oh)
        self.parts = []
        for s, system in enumerate(self.systems):
            log_beta = -LN10 * np.cumsum([0.0] + [self.values[name] for name in system.pka_ids])
            exponent = log_beta[:, None] - system.lost * y + system.raised * l
            share = np.exp(exponent - exponent.max(axis=0))
            share /= share.sum(axis=0)
            c = mixture[2 + s]
            lost = (share * system.lost).sum(axis=0)
            z, z2 = system.z[0] - lost, (share * system.z2).sum(axis=0)
            away = system.lost - lost
            f += c * z
            g -= 0.5 * c * z2
            f_y += c * (share * away * away).sum(axis=0)
            g_y += 0.5 * c * (share * system.z2 * away).sum(axis=0)
            if self.a_ln10 != 0:
                spread = share * (system.raised - (share * system.raised).sum(axis=0))
                f_l += c * (system.z * spread).sum(axis=0)
                g_l -= 0.5 * c * (system.z2 * spread).sum(axis=0)
            self.parts.append((c, share, z, z2))
        self.h, self.oh, self.l, self.l_slope = h, oh, l, l_slope
        self.jacobian = f_y, f_l * l_slope, g_y, 1 + g_l * l_slope
        return f, g

    def newton(self, mixture, y, ionic):
        """From near the solution; None where it does not settle."""
        for self.rounds in range(1, 41):
            f, g = self.equations(mixture, y, ionic)
            f_y, f_i, g_y, g_i = self.jacobian
            determinant = f_y * g_i - f_i * g_y
            step_y = np.clip((g * f_i - f * g_i) / determinant, -3, 3)
            step_i = (f * g_y - g * f_y) / determinant
            y = y + step_y
            ionic = np.maximum(ionic + step_i, 0.1 * ionic)
            # Quadratic: what such a step leaves over is its square.
            if np.abs(step_y).max() < 1e-8 and np.abs(step_i / ionic).max() < 1e-8:
                return y, ionic
        return None

    def bisect(self, mixture):
        """From anywhere, slowly: the net charge rises with y when I follows it."""
        low, high = np.full(mixture.shape[1], -18 * LN10), np.full(mixture.shape[1], 3 * LN10)
        ionic = np.full(mixture.shape[1], 0.05)
        for _ in range(62):
            y = 0.5 * (low + high)
            for _ in range(40):
                _, g = self.equations(mixture, y, ionic)
                last, ionic = ionic, np.maximum(ionic - g / np.maximum(self.jacobian[3], 0.3), 0.1 * ionic)
                if np.abs(ionic / last - 1).max() < 1e-13:
                    break
            f, _ = self.equations(mixture, y, ionic)
            low, high = np.where(f < 0, y, low), np.where(f < 0, high, y)
        return 0.5 * (low + high), ionic

    # -- the curve -----------------------------------------------------------------------------------------------

    def start_from_readings(self):
        """The measured readings as first solutions, and an ionic strength within reach."""
        self.ionic = np.full(self.volumes.shape, 0.05)
        self.y = self.from_reading(self.measured, self.ionic)

    def from_reading(self, reading, ionic):
        """y that a reading means."""
        if self.is_potential:
            shown = (self.values[self.zero] - reading) / (self.values["reading.slope"] * self.nernst)
        else:
            shown = 7 + (reading - 7 - self.values[self.zero]) / self.values["reading.slope"]
        return -shown * LN10 - (0 if self.shows_activity else self.davies(ionic)[0])

    def curve(self, free, volumes=None):
        """Predicted readings."""
        self.take(free)
        self.at = self.volumes if volumes is None else volumes
        self.mixed = self.mix(self.at)
        mixture = self.mixed[2]
        solution = None if self.y is None or self.y.shape != self.at.shape else self.newton(mixture, self.y, self.ionic)
        self.searched = solution is None
        self.y, self.ionic = self.bisect(mixture) if self.searched else solution
        shown = -self.y / LN10
        if not self.shows_activity:
            shown = shown - self.davies(self.ionic)[0] / LN10
        if self.is_potential:
            return self.values[self.zero] - self.values["reading.slope"] * self.nernst * shown
        return 7 + self.values[self.zero] + self.values["reading.slope"] * (shown - 7)

    def adjoint(self, y, ionic):
        """d reading / d F and d reading / d G, with the sign of a change of the equations."""
        self.equations(self.mixed[2], y, ionic)
        per_shown = -self.values["reading.slope"] * self.nernst if self.is_potential else self.values["reading.slope"]
        by_y = -per_shown / LN10
        by_i = 0 if self.shows_activity else by_y * self.l_slope
        f_y, f_i, g_y, g_i = self.jacobian
        determinant = f_y * g_i - f_i * g_y
        return (by_i * g_y - by_y * g_i) / determinant, (by_y * f_i - by_i * f_y) / determinant

    def by_mixture(self, by_f, by_g):
        """d reading / d mixture, one row per component."""
        rows = [by_f, -0.5 * by_g]
        rows += [by_f * z - 0.5 * by_g * z2 for _, _, z, z2 in self.parts]
        return np.array(rows)

    def derivatives(self):
        """d reading / d free quantity, one column each, and d reading / d burette volume, at the curve asked last."""
        true, total, mixture = self.mixed
        by_f, by_g = self.adjoint(self.y, self.ionic)
        rows = self.by_mixture(by_f, by_g)
        by_volume = (rows * (self.contents["titrant"][:, None] - mixture)).sum(axis=0) / total
        columns = []
        for name in self.ids:
            amount = next((amount for amount in self.amounts if amount[0] == name), None)
            if amount is not None:
                share = (self.values["sample.volume"] if amount[1] == "sample" else true) / total
                column = share * (self.brings(name, *amount[2:]) @ rows)
            elif "pKa" in name:
                column = self.by_constant(name, by_f, by_g)
            elif name == "medium.pKw":
                column = LN10 * self.oh * (by_f + 0.5 * by_g)
            elif name == self.zero:
                column = np.ones_like(total)
            elif name == "burette.gain":
                column = by_volume * self.at
            else:
                raise NotImplementedError(name)
            columns.append(column)
        return np.array(columns).T, by_volume * self.values["burette.gain"]

    def by_constant(self, name, by_f, by_g):
        s = next(s for s, system in enumerate(self.systems) if name in system.pka_ids)
        system, (c, share, z, z2) = self.systems[s], self.parts[s]
        later = share[system.pka_ids.index(name) + 1 :]
        tail = later.sum(axis=0)
        f = (later * system.z[-len(later) :]).sum(axis=0) - z * tail
        g = (later * system.z2[-len(later) :]).sum(axis=0) - z2 * tail
        return -LN10 * c * (by_f * f - 0.5 * by_g * g)

    def meet(self, chosen):
        """Where the curve passes the measured readings of the chosen points, at the free quantities taken last.

        At given y and I, F is linear in the volume of titrant: F of the sample alone, of the titrant alone and of water
        alone, each times its volume, add up to zero. Returns burette volumes, derivatives and slopes there, the slopes
        once as they are and once as those of p[H] (see slopes_at_readings).
        """
        kept = self.at, self.mixed, self.y, self.ionic
        reading, ionic = self.measured[chosen], self.ionic[chosen]
        sample, titrant = (self.contents[which][:, None] * np.ones(len(reading)) for which in ("sample", "titrant"))
        for _ in range(60):
            y = self.from_reading(reading, ionic)
            parts = [self.equations(mixture, y, ionic)[0] for mixture in (sample, titrant, 0 * sample)]
            true = self.values["sample.volume"] * parts[0] + self.values["sample.extraWater"] * parts[2]
            self.at = -true / parts[1] / self.values["burette.gain"]
            self.mixed = self.mix(self.at)
            _, g = self.equations(self.mixed[2], y, ionic)
            last, ionic = ionic, ionic - g
            if np.abs(ionic / last - 1).max(initial=0) < 1e-14:
                break
        self.y, self.ionic = self.from_reading(reading, ionic), ionic
        found = self.at, *self.derivatives(), self.slopes_of_concentration(self.y)
        self.at, self.mixed, self.y, self.ionic = kept
        return found

    def slopes_at_readings(self):
        """d reading / d burette volume that the curve asked last has at the height of each measured reading.

        Mixture and ionic strength are those of the point's own volume, and the slope is that of p[H].
        """
        return self.slopes_of_concentration(self.from_reading(self.measured, self.ionic))

    def slopes_of_concentration(self, y):
        _, total, mixture = self.mixed
        shows, self.shows_activity = self.shows_activity, False
        by_f, by_g = self.adjoint(y, self.ionic)
        self.shows_activity = shows
        rows = self.by_mixture(by_f, by_g)
        by_volume = (rows * (self.contents["titrant"][:, None] - mixture)).sum(axis=0) / total
        return by_volume * self.values["burette.gain"]
