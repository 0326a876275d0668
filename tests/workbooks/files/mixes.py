"""Invented mixes whose volumetrics follow from masses and gravities, with the scatter of a laboratory."""

import random


def rounded(value, places):
    return round(value + 0.0, places)


class Mix:
    """Bulk gravity follows from voids that fall with binder content and flatten past the optimum."""

    def __init__(self, seed, optimum, gsb, absorption=0.5, gb=1.028, slope=2.1, target=4.0, dust=5.2, mass=4750.0):
        self.random = random.Random(seed)
        self.optimum = optimum
        self.gsb = gsb
        self.gb = gb
        self.dust = dust
        self.slope = slope
        self.target = target
        self.mass = mass
        self.gse = gsb * gb / (gb - absorption / 100 * gsb)
        self.absorption = absorption

    def noise(self, sd):
        return self.random.gauss(0, sd)

    def true_gmm(self, pb):
        return 100 / ((100 - pb) / self.gse + pb / self.gb)

    def true_voids(self, pb):
        x = pb - self.optimum
        return self.target - self.slope * x + 0.35 * x * x

    def gmm(self, pb):
        return rounded(self.true_gmm(pb) + self.noise(0.0035), 3)

    def gmb(self, pb, voids=None, sd=0.005):
        voids = self.true_voids(pb) if voids is None else voids
        return self.true_gmm(pb) * (1 - voids / 100) + self.noise(sd)

    def masses(self, pb, voids=None, mass=None, sd=0.005, places=1):
        """Dry, in water, saturated surface-dry, and the bulk gravity that they give."""
        gmb = self.gmb(pb, voids, sd)
        dry = rounded((mass or self.mass) * (1 + self.noise(0.0015)), places)
        held = abs(self.noise(0.0006)) + 0.0009 + 0.0003 * (voids or 4)
        ssd = rounded(dry * (1 + held), places)
        water = rounded(ssd - dry / gmb, places)
        return dry, water, ssd, dry / (ssd - water)

    def rice(self, pb, flask=7421.6, mass=2030.0):
        """Dry sample, flask full of water, flask with sample and water, and the gravity that they give."""
        gmm = self.true_gmm(pb) + self.noise(0.0035)
        a = rounded(mass + self.noise(9), 1)
        e = rounded(a + flask - a / gmm, 1)
        return a, flask, e, a / (a + flask - e)

    def volumetrics(self, pb, gmb, gmm):
        ps = 100 - pb
        va = 100 * (1 - gmb / gmm)
        vma = 100 - gmb * ps / self.gsb
        gse = ps / (100 / gmm - pb / self.gb)
        pba = 100 * (gse - self.gsb) / (gse * self.gsb) * self.gb
        pbe = pb - pba * ps / 100
        return {
            "va": va,
            "vma": vma,
            "vfa": 100 * (vma - va) / vma,
            "gse": gse,
            "pba": pba,
            "pbe": pbe,
            "vbe": vma - va,
            "dp": self.dust / pbe,
        }


def mean(values):
    return sum(values) / len(values)


def deviation(values):
    m = mean(values)
    return (sum((v - m) ** 2 for v in values) / (len(values) - 1)) ** 0.5


US_SIEVES = [25.0, 19.0, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075]


def blend_of(shares, gradations, sieves, places=1):
    return [rounded(sum(p * g[s] for p, g in zip(shares, gradations)) / 100, places) for s in range(len(sieves))]


def harmonic(shares, gravities):
    return 100 / sum(p / g for p, g in zip(shares, gravities))
