"""Creep in two forms, trial blends, moisture by subset, wheel tracking by wheel, modulus as one long list."""

import math

from files import UNITS, with_office, with_text, with_xlsxwriter
from lab import Book
from mixes import Mix, blend_of, mean, rounded

TIMES = [0.5, 1, 2, 4, 8, 16, 32, 64, 128, 256, 512, 1000]


def strain(time, temperature, stress):
    """Microstrain of a solid under a constant stress in kPa."""
    reduced = time * 10 ** (1.4 * (temperature + 10) / 10)
    return stress * (0.06 + 9 / (1 + (reduced / 2e5) ** -0.45))


def creep_strain():
    """Stress in merged heads, specimens beneath, temperature above each of two tables on a sheet."""
    book = Book(UNITS)
    mix = Mix(2308, 5.3, 2.66)
    s = book.sheet("Creep")
    s.put(1, 1, "Uniaxial creep, Brightwater laboratory", bold=True)
    row = 3
    for temperature in (-10, 5):
        s.put(row, 1, f"Test temperature {temperature} °C", bold=True)
        s.put(row + 1, 1, "t (s)").merge(row + 1, 1, 1, 2)
        for g, stress in enumerate((150, 300)):
            s.put(row + 1, 2 + 3 * g, f"Axial strain (µε) at {stress} kPa").merge(row + 1, 2 + 3 * g, 3)
            s.row(row + 2, 2 + 3 * g, ["C1", "C2", "C3"])
        for r, time in enumerate(TIMES, row + 3):
            s.put(r, 1, time)
            for g, stress in enumerate((150, 300)):
                for k in range(3):
                    value = rounded(strain(time, temperature, stress) * (0.96 + 0.04 * k) * (1 + mix.noise(0.003)), 1)
                    s.read(r, 2 + 3 * g + k, "creep-strain", value,
                           {"temperature": temperature, "specimen": f"C{k + 1}", "time": time, "stress": stress}, fmt="0.0")
        row += 3 + len(TIMES) + 2
    s.put(row, 1, "Strains corrected for seating. Linear up to 300 kPa.", italic=True)
    return book, lambda path: with_office(book, path)


def creep_wide():
    """A row for each specimen, times across."""
    book = Book(UNITS, flat=True)
    mix = Mix(2309, 5.3, 2.66)
    s = book.sheet("")
    s.put(1, 1, "Creep compliance (1/GPa)").put(2, 3, "Time (s)").put(3, 1, "Temp (C)").put(3, 2, "Spec").row(3, 3, [1, 3, 10, 30, 100, 300, 1000])
    row = 4
    for temperature in (-20, -10, 0):
        for k in range(3):
            s.put(row, 1, temperature).put(row, 2, f"P{k + 1}")
            factor = 1 + mix.noise(0.04)
            for c, time in enumerate([1, 3, 10, 30, 100, 300, 1000], 3):
                value = rounded(strain(time, temperature, 1.0) * factor * (1 + mix.noise(0.004)), 4)
                s.read(row, c, "creep-compliance", value, {"temperature": temperature, "specimen": f"P{k + 1}", "time": time})
            row += 1
    return book, lambda path: with_text(s, path, delimiter=",", encoding="utf-8")


creep_wide.extension = ".csv"

SIEVES = [19.0, 12.5, 9.5, 4.75, 2.36, 0.6, 0.075]
PILES = [("1/2 x 4", [100, 92, 55, 8, 3.0, 2.1, 1.2]), ("3/8 x 8", [100, 100, 96, 34, 6.0, 3.0, 1.6]), ("Wash. screenings", [100, 100, 100, 98, 74, 33, 7.9]),
         ("Blend sand", [100, 100, 100, 99, 93, 58, 2.4])]
SHARES = {"Blend 1": [30, 24, 34, 12], "Blend 2": [36, 22, 32, 10], "Blend 3": [26, 28, 38, 8]}


def blends():
    """Stage one of a design: three blends at one binder content, each with its own volumetrics."""
    book = Book(UNITS)
    s = book.sheet("Trial Blends")
    s.put(1, 1, "STAGE 1 - SELECTION OF DESIGN AGGREGATE STRUCTURE", bold=True)
    s.put(3, 1, "Aggregate proportions (%)", bold=True).row(4, 1, ["", "Blend 1", "Blend 2", "Blend 3"])
    for r, (name, _p) in enumerate(PILES, 5):
        s.put(r, 1, name)
        for c, (blend, shares) in enumerate(SHARES.items(), 2):
            s.read(r, c, "stockpile-share", shares[r - 5], {"blend": blend[-1], "stockpile": name})
    s.put(9, 1, "Sum", bold=True).row(9, 2, [100, 100, 100])
    s.put(11, 1, "Gradation (% passing)", bold=True).row(12, 1, ["Sieve (in. / No.)", "Blend 1", "Blend 2", "Blend 3"])
    for r, (name, sieve) in enumerate(zip(["3/4", "1/2", "3/8", "No. 4", "No. 8", "No. 30", "No. 200"], SIEVES), 13):
        s.put(r, 1, name)
        for c, (blend, shares) in enumerate(SHARES.items(), 2):
            value = blend_of(shares, [p[1] for p in PILES], SIEVES)[r - 13]
            s.read(r, c, "percent-passing", value, {"blend": blend[-1], "sieve": sieve}, fmt="0.0")
    v = book.sheet("Blend Volumetrics")
    v.put(1, 1, "Compacted at an estimated binder content of 5.5 %", bold=True)
    v.row(3, 1, ["Blend", "Gsb", "Gmm", "Gmb @ Ndes", "Va, %", "VMA, %", "VFA, %", "%Gmm @ Nini", "DP", "Rank"])
    for r, (blend, gsb, seed) in enumerate([("1", 2.661, 1), ("2", 2.664, 2), ("3", 2.657, 3)], 4):
        mix = Mix(2310 + seed, 5.3 + 0.15 * seed, gsb, absorption=0.5)
        gmm, gmb = mix.gmm(5.5), rounded(mix.gmb(5.5), 3)
        x, at = mix.volumetrics(5.5, gmb, gmm), {"blend": blend}
        v.put(r, 1, int(blend)).read(r, 2, "bulk-specific-gravity-aggregate", gsb, at, fmt="0.000").read(r, 3, "maximum-specific-gravity", gmm, at, fmt="0.000")
        v.read(r, 4, "bulk-specific-gravity-mix", gmb, at, fmt="0.000").read(r, 5, "air-voids", rounded(x["va"], 1), at, fmt="0.0")
        v.read(r, 6, "voids-in-mineral-aggregate", rounded(x["vma"], 1), at, fmt="0.0").read(r, 7, "voids-filled-with-asphalt", rounded(x["vfa"], 1), at, fmt="0.0")
        v.read(r, 8, "relative-density", rounded(86.1 + 0.4 * seed, 1), {**at, "gyrations": "initial"}, fmt="0.0")
        v.read(r, 9, "dust-proportion", rounded(x["dp"], 2), at, fmt="0.00").put(r, 10, [2, 1, 3][seed - 1])
    v.put(7, 1, "Criteria").row(7, 5, ["4.0", "≥ 14.0", "65 - 75", "≤ 89.0", "0.6 - 1.2"])
    book.note("All blends were compacted at 5.5 %; that content is the blends' own and stands in a title.")
    for reading in book.readings:
        reading["may"] = {"gyrations": "design"} if reading["quantity"] == "bulk-specific-gravity-mix" else {}
    return book, lambda path: with_xlsxwriter(book, path)


def moisture():
    """Subset in a column, saturation and loads beside, formulas computed by the office program."""
    book = Book(UNITS)
    mix = Mix(2314, 5.6, 2.64, absorption=0.5, mass=3790)
    s = book.sheet("T283")
    s.put(1, 1, "Moisture susceptibility", bold=True).put(2, 1, "Rice SG").put(3, 1, "Dia. (mm)")
    s.read(2, 2, "maximum-specific-gravity", rounded(mix.true_gmm(5.6), 3), {}, fmt="0.000").read(3, 2, "specimen-diameter", 150, {})
    s.row(5, 1, ["Puck", "Subset", "t (mm)", "Dry wt (g)", "Subm. wt (g)", "SSD wt (g)", "AV (%)", "Vac. sat. wt (g)", "Sat. (%)", "Pmax (kN)", "ITS (kPa)"])
    rows = []
    for n, subset in enumerate("UCUCUC", 1):
        row, at = 5 + n, {"specimen": f"P{n}"}
        dry, water, ssd, gmb = mix.masses(5.6, voids=7.0, mass=3790)
        gmm = rounded(mix.true_gmm(5.6), 3)
        voids = (ssd - water) * (1 - gmb / gmm)
        height = rounded((ssd - water) / 17.6715, 1)
        strength = (690 if subset == "C" else 822) + mix.noise(18)
        load = rounded(strength * math.pi * height * 150 / 2e6, 2)
        s.put(row, 1, f"P{n}").put(row, 2, subset).read(row, 3, "specimen-thickness", height, at, fmt="0.0")
        s.read(row, 4, "mass-in-air", dry, at).read(row, 5, "mass-in-water", water, at).read(row, 6, "mass-saturated-surface-dry", ssd, at)
        s.read(row, 7, "air-voids", 100 * (1 - dry / (ssd - water) / gmm), at, fmt="0.0", formula=f"=100*(1-D{row}/(F{row}-E{row})/$B$2)")
        if subset == "C":
            wet = rounded(dry + voids * (0.745 + mix.noise(0.02)), 1)
            s.put(row, 8, wet)
            v = (ssd - water) * (1 - dry / (ssd - water) / gmm)
            s.read(row, 9, "degree-of-saturation", 100 * (wet - dry) / v, at, fmt="0.0", formula=f"=100*(H{row}-D{row})/(G{row}/100*(F{row}-E{row}))")
        s.read(row, 10, "failure-load", load, at, fmt="0.00")
        value = 2e6 * load / (math.pi * height * 150)
        s.read(row, 11, "tensile-strength-conditioned" if subset == "C" else "tensile-strength-dry", value, at, fmt="0",
               formula=f"=2000000*J{row}/(PI()*C{row}*$B$3)")
        rows.append((subset, value))
    s.put(13, 1, "Mean U").put(13, 11, 0, fmt="0", formula="=AVERAGE(K6,K8,K10)").put(14, 1, "Mean C").put(14, 11, 0, fmt="0", formula="=AVERAGE(K7,K9,K11)")
    ratio = mean([v for k, v in rows if k == "C"]) / mean([v for k, v in rows if k == "U"])
    s.put(15, 1, "TSR", bold=True).read(15, 11, "tensile-strength-ratio", ratio, {}, unit="fraction", fmt="0.0%", formula="=K14/K13")
    s.put(16, 1, "U = unconditioned, C = conditioned with one freeze-thaw cycle", italic=True)
    return book, lambda path: with_office(book, path)


def wheels():
    """Temperature in °F in a cell, four specimens, passes across."""
    book = Book(UNITS)
    mix = Mix(2315, 5.4, 2.65)
    s = book.sheet("Hamburg")
    s.put(2, 2, "HAMBURG WHEEL TRACKER REPORT", bold=True).put(4, 2, "Water temp., °F").put(4, 5, 122).put(5, 2, "Load, lb").put(5, 5, 158)
    passes = [1, 1000, 2000, 4000, 8000, 12000, 16000, 20000]
    s.put(7, 2, "Specimen").put(7, 3, "Air voids, %").put(7, 4, "Rut depth, mm, at passes").merge(7, 4, len(passes)).row(8, 4, passes)
    for r, name in enumerate(["W1", "W2"], 9):
        s.put(r, 2, name).read(r, 3, "air-voids", rounded(7 + mix.noise(0.3), 1), {"specimen": name})
        for c, n in enumerate(passes, 4):
            value = 0.0 if n == 1 else rounded(0.41 * (n / 1000) ** 0.61 * (1 + 0.1 * (r - 9)) + mix.noise(0.02), 2)
            s.read(r, c, "wheel-track-rut-depth", value, {"specimen": name, "passes": n, "temperature": 50.0}, fmt="0.00")
    s.put(11, 2, "Mean").put(12, 2, "Max. allowed").put(12, 11, 12.5)
    for c in range(4, 12):
        s.put(11, c, 0, fmt="0.00", formula=f"=AVERAGE({'ABCDEFGHIJK'[c - 1]}9:{'ABCDEFGHIJK'[c - 1]}10)")
    s.put(14, 2, "Stripping inflection point").put(14, 5, "none")
    s.put(15, 2, "Passes to 12.5 mm rut").read(15, 5, "passes-to-rut-depth", 20000, {"temperature": 50.0}, text=">20,000", qualifier=">")
    book.note("No inflection point is a result without a number and stands outside the scored readings.")
    return book, lambda path: with_office(book, path)


def modulus():
    """One long list in ksi and °F with phase angles."""
    book = Book(UNITS)
    mix = Mix(2316, 5.4, 2.65)
    s = book.sheet("AMPT export")
    s.row(1, 1, ["Specimen", "Temp (°F)", "Freq (Hz)", "|E*| (ksi)", "Phase angle (deg)", "Load cycles"], bold=True)
    row = 2
    for name in ("E1", "E2", "E3"):
        factor = 1 + mix.noise(0.04)
        for fahrenheit, top, slope, phase in [(40, 2150, 0.09, 9), (70, 980, 0.18, 19), (100, 265, 0.29, 28)]:
            for frequency in (25, 10, 1, 0.1):
                at = {"specimen": name, "temperature": (fahrenheit - 32) / 1.8, "frequency": frequency}
                s.put(row, 1, name).put(row, 2, fahrenheit).put(row, 3, frequency).put(row, 6, 100 if frequency > 1 else 20)
                s.read(row, 4, "dynamic-modulus", rounded(top * factor * (frequency / 25) ** slope, 1), at, unit="ksi", fmt="#,##0.0")
                s.read(row, 5, "mix-phase-angle", rounded(phase + 1.9 * math.log10(25 / frequency) + mix.noise(0.2), 1), at, fmt="0.0")
                row += 1
    return book, lambda path: with_xlsxwriter(book, path, inline=True)


BOOKS = {"08-creep-strain": creep_strain, "09-creep-wide": creep_wide, "10-trial-blends": blends, "11-moisture": moisture, "12-hamburg-report": wheels,
         "13-modulus-list": modulus}
