"""Brightwater's central laboratory (US units) and Tollhouse's gyratory laboratory (SI)."""

import datetime

from files import UNITS, with_office, with_xlsxwriter
from lab import Book, address
from mixes import Mix, blend_of, harmonic, mean, rounded

SIEVES = [25.0, 19.0, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075]
NAMES = ['1"', '3/4"', '1/2"', '3/8"', "#4", "#8", "#16", "#30", "#50", "#100", "#200"]
PILES = [
    ("#67 Granite", 22, [100, 97, 62, 21, 4.1, 2.0, 1.7, 1.5, 1.4, 1.2, 0.9], 2.688, 2.731, 0.58),
    ("#89 Granite", 30, [100, 100, 100, 96, 31, 6.2, 3.5, 2.4, 1.9, 1.5, 1.1], 2.676, 2.724, 0.66),
    ("W-10 Screenings", 33, [100, 100, 100, 100, 98, 72, 50, 35, 23, 13.6, 8.2], 2.657, 2.719, 0.86),
    ("Nat. Sand", 14, [100, 100, 100, 100, 99, 92, 78, 56, 24, 6.1, 1.9], 2.631, 2.668, 0.53),
    ("BHF", 1, [100, 100, 100, 100, 100, 100, 100, 100, 98, 92, 80], 2.690, 2.702, 0.20),
]


def summary(book, mix, design):
    s = book.sheet("JMF Summary")
    s.put(1, 3, "Brightwater Paving - Central Laboratory", bold=True)
    s.put(2, 3, "Superpave Mix Design - Job Mix Formula", bold=True).merge(2, 3, 4)
    pairs = [
        ("Project No.", "CV-26-0417"), ("Mix ID", "BW-12.5-R3"), ("Mix type", "Dense graded"),
        ("NMAS", "1/2 in."), ("Course", "Surface"), ("PG Binder", "PG 64-22"),
    ]
    for at, (label, value) in enumerate(pairs):
        s.put(5 + at, 2, label).put(5 + at, 4, value)
    book.know("nominalMaximumSize", 12.5)
    book.know("mixType", "dense-graded")
    book.know("course", "surface")
    book.know("binderGrade", "PG 64-22")
    s.put(5, 7, "Design ESALs, millions").put(5, 9, 12)
    book.know("designTraffic", 12)
    for at, (label, quantity, value) in enumerate(
        [("Nini", "gyrations-initial", 7), ("Ndes", "gyrations-design", 75), ("Nmax", "gyrations-maximum", 115)]
    ):
        s.put(6 + at, 7, label).read(6 + at, 9, quantity, value)
    s.put(9, 7, "Date of design").put(9, 9, datetime.date(2026, 2, 19))
    s.put(10, 7, "Mixing temp.,\n°F", wrap=True).read(10, 9, "mixing-temperature", 311, unit="°F")
    s.put(11, 7, "Compaction temp., °F").read(11, 9, "compaction-temperature", 290, unit="°F")
    s.row(14, 2, ["Property", None, "At Opt. AC", "Spec. Min", "Spec. Max"], bold=True).merge(14, 2, 2)
    at = {"trial": "design"}
    rows = [
        ("Asphalt Content, % by wt. of mix", "binder-content", mix.optimum, None, None, "0.0"),
        ("Gmb @ Ndes", "bulk-specific-gravity-mix", design["gmb"], None, None, "0.000"),
        ("Gmm", "maximum-specific-gravity", design["gmm"], None, None, "0.000"),
        ("Air Voids, % (Va)", "air-voids", rounded(design["va"], 1), 3.5, 4.5, "0.0"),
        ("VMA, %", "voids-in-mineral-aggregate", rounded(design["vma"], 1), 14.0, None, "0.0"),
        ("VFA, %", "voids-filled-with-asphalt", rounded(design["vfa"], 0), 65, 78, "0"),
        ("Eff. Asphalt (Pbe), %", "effective-binder-content", rounded(design["pbe"], 2), None, None, "0.00"),
        ("Dust / Pbe", "dust-proportion", rounded(design["dp"], 2), 0.6, 1.2, "0.00"),
        ("Gse", "effective-specific-gravity-aggregate", rounded(design["gse"], 3), None, None, "0.000"),
        ("Gsb (combined)", "bulk-specific-gravity-aggregate", design["gsb"], None, None, "0.000"),
        ("Gb", "binder-specific-gravity", mix.gb, None, None, "0.000"),
    ]
    for row, (label, quantity, value, low, high, fmt) in enumerate(rows, 15):
        s.put(row, 2, label).merge(row, 2, 2)
        own = {} if quantity in ("bulk-specific-gravity-aggregate", "binder-specific-gravity") else at
        s.read(row, 4, quantity, value, own, fmt=fmt).put(row, 5, low, fmt=fmt).put(row, 6, high, fmt=fmt)
    s.put(28, 2, "* AC content includes 0.5% liquid anti-strip by wt. of binder", italic=True)
    s.put(30, 2, "Designed by:").put(30, 4, "________________")


def aggregates(book, blend):
    s = book.sheet("Aggregate Blend")
    s.put(1, 1, "AGGREGATE BLEND SHEET", bold=True)
    s.put(3, 1, "Material").put(4, 1, "% of Aggregate")
    for c, (name, share, *_rest) in enumerate(PILES, 3):
        s.put(3, c, name, bold=True).read(4, c, "stockpile-share", share, {"stockpile": name})
    s.put(3, 8, "Combined", bold=True).put(4, 8, 100).put(3, 9, "JMF", bold=True)
    s.put(3, 10, "Control Points", bold=True).merge(3, 10, 2)
    s.row(5, 1, ["Sieve", "mm", "% Passing"]).merge(5, 3, 5).put(5, 10, "Min").put(5, 11, "Max")
    control = {19.0: (100, 100), 12.5: (90, 100), 9.5: (None, 90), 2.36: (28, 58), 0.075: (2, 10)}
    for r, sieve in enumerate(SIEVES):
        row = 6 + r
        s.put(row, 1, NAMES[r]).put(row, 2, sieve, fmt="0.0##")
        fmt = "0.0" if sieve < 5 else "0"
        for c, pile in enumerate(PILES, 3):
            s.read(row, c, "percent-passing", pile[2][r], {"stockpile": pile[0], "sieve": sieve}, fmt=fmt)
        s.maybe(row, 8, "percent-passing", blend[r], {"sieve": sieve}, fmt="0.0")
        target = blend[r] if sieve == 0.075 else round(blend[r])
        s.read(row, 9, "percent-passing", target, {"sieve": sieve, "trial": "design"}, fmt=fmt, bold=True)
        low, high = control.get(sieve, (None, None))
        s.put(row, 10, low).put(row, 11, high)
    labels = [
        ("Bulk Sp. Gr. (Gsb)", "bulk-specific-gravity-aggregate", 3, "0.000"),
        ("Apparent Sp. Gr. (Gsa)", "apparent-specific-gravity-aggregate", 4, "0.000"),
        ("Absorption, %", "water-absorption", 5, "0.00"),
    ]
    shares = [p[1] for p in PILES]
    for r, (label, quantity, field, fmt) in enumerate(labels, 19):
        s.put(r, 1, label)
        for c, pile in enumerate(PILES, 3):
            s.read(r, c, quantity, pile[field], {"stockpile": pile[0]}, fmt=fmt)
        values = [p[field] for p in PILES]
        total = sum(a * b for a, b in zip(shares, values)) / 100 if field == 5 else harmonic(shares, values)
        s.read(r, 8, quantity, rounded(total, 2 if field == 5 else 3), {}, fmt=fmt)
    s.put(23, 1, "Note: gravities are the average of two tests (T 84 / T 85).", italic=True)


def brightwater():
    book = Book(UNITS)
    shares = [p[1] for p in PILES]
    blend = blend_of(shares, [p[2] for p in PILES], SIEVES)
    gsb = rounded(harmonic(shares, [p[3] for p in PILES]), 3)
    mix = Mix(1101, 5.4, gsb, absorption=0.55, gb=1.031, dust=blend[-1])
    gmm = rounded(mix.true_gmm(5.4), 3)
    design = {"gmm": gmm, "gmb": rounded(gmm * 0.9602, 3), "gsb": gsb}
    design.update(mix.volumetrics(5.4, design["gmb"], gmm))
    summary(book, mix, design)
    aggregates(book, blend)
    bulk, rice, table = book.sheet("Gmb T166"), book.sheet("Gmm T209"), book.sheet("Volumetrics")
    bulk.put(1, 1, "BULK SPECIFIC GRAVITY OF COMPACTED SPECIMENS", bold=True)
    rice.put(1, 1, "THEORETICAL MAXIMUM SPECIFIC GRAVITY - FLASK METHOD", bold=True)
    rice.row(3, 1, ["Trial", "AC, %", "Test", "Dry Sample (A), g", "Flask + Water (D), g",
                    "Flask + Water + Sample (E), g", "Gmm", "Avg. Gmm"], bold=True)
    results = []
    for t, pb in enumerate([4.9, 5.4, 5.9, 6.4], 1):
        trial = str(t)
        top = 3 + (t - 1) * 8
        bulk.put(top, 1, f"TRIAL {t} - {pb} % AC", bold=True).merge(top, 1, 7)
        bulk.row(top + 1, 1, ["Spec.", "Dry Wt. (A)", "Wt. in Water (C)", "SSD Wt. (B)", "Volume", "Gmb", "Ht. @ Ndes"])
        bulk.row(top + 2, 2, ["g", "g", "g", "cc", None, "mm"], italic=True)
        gmbs = []
        for n in range(3):
            dry, water, ssd, gmb = mix.masses(pb)
            row, at = top + 3 + n, {"trial": trial, "specimen": f"{t}{'ABC'[n]}"}
            gmbs.append(rounded(gmb, 3))
            bulk.put(row, 1, at["specimen"])
            bulk.read(row, 2, "mass-in-air", dry, at).read(row, 3, "mass-in-water", water, at)
            bulk.read(row, 4, "mass-saturated-surface-dry", ssd, at).put(row, 5, rounded(ssd - water, 1))
            bulk.read(row, 6, "bulk-specific-gravity-mix", rounded(gmb, 3), at, fmt="0.000")
            height = rounded((ssd - water) / 17.671 * 1.0 * 10 / 10 * 10 / 10 + mix.noise(0.25), 1)
            bulk.read(row, 7, "specimen-height", height, {**at, "gyrations": "design"})
        bulk.put(top + 6, 1, "Average", bold=True).put(top + 6, 6, rounded(mean(gmbs), 3), fmt="0.000", bold=True)
        gmms = []
        for n in range(2):
            a, d, e, gmm = mix.rice(pb)
            row = 4 + (t - 1) * 2 + n
            gmms.append(rounded(gmm, 3))
            if n == 0:
                rice.put(row, 1, t).merge(row, 1, 1, 2).put(row, 2, pb).merge(row, 2, 1, 2)
            rice.put(row, 3, "12"[n]).row(row, 4, [a, d, e])
            rice.read(row, 7, "maximum-specific-gravity", gmms[-1], {"trial": trial, "specimen": "12"[n]}, fmt="0.000")
        rice.put(row - 1, 8, rounded(mean(gmms), 3), fmt="0.000").merge(row - 1, 8, 1, 2)
        results.append((trial, pb, rounded(mean(gmbs), 3), rounded(mean(gmms), 3)))
    table.put(1, 1, "SUMMARY OF MIX PROPERTIES AT EACH TRIAL ASPHALT CONTENT", bold=True)
    labels = [
        ("AC, % by Wt. of Mix", "binder-content", "pb", 1), ("Gmb (avg.)", "bulk-specific-gravity-mix", "gmb", 3),
        ("Gmm (avg.)", "maximum-specific-gravity", "gmm", 3), ("Air Voids, %", "air-voids", "va", 1),
        ("VMA, %", "voids-in-mineral-aggregate", "vma", 1), ("VFA, %", "voids-filled-with-asphalt", "vfa", 1),
        ("Gse", "effective-specific-gravity-aggregate", "gse", 3), ("Pba, %", "absorbed-binder", "pba", 2),
        ("Pbe, %", "effective-binder-content", "pbe", 2), ("Dust to Pbe ratio", "dust-proportion", "dp", 2),
    ]
    table.put(3, 1, "Property")
    for c, (trial, pb, gmb, gmm) in enumerate(results, 2):
        table.put(3, c, f"Trial {trial}", bold=True)
        values = {"pb": pb, "gmb": gmb, "gmm": gmm, **mix.volumetrics(pb, gmb, gmm)}
        for r, (label, quantity, key, places) in enumerate(labels, 4):
            table.put(r, 1, label)
            put = table.maybe if key in ("gmb", "gmm") else table.read
            put(r, c, quantity, rounded(values[key], places), {"trial": trial}, fmt="0." + "0" * places)
    strength(book, mix)
    return book, lambda path: with_xlsxwriter(book, path)


def strength(book, mix):
    s = book.sheet("TSR T283")
    s.put(1, 1, "RESISTANCE TO MOISTURE DAMAGE", bold=True)
    s.put(2, 1, "AC content: 5.4 %      Gmm: see Gmm sheet      Freeze-thaw: yes")
    s.put(4, 2, "Unconditioned (Dry) Subset", bold=True).merge(4, 2, 3)
    s.put(4, 5, "Conditioned (Wet) Subset", bold=True).merge(4, 5, 3)
    s.put(5, 1, "Specimen No.")
    labels = ["Diameter, in.", "Thickness, in.", "Dry Weight in Air, g", "SSD Weight, g", "Weight in Water, g",
              "Air Voids, %", "Saturation, %", "Max. Load, lbf", "Tensile Strength, psi"]
    s.down(6, 1, labels)
    gmm = mix.true_gmm(5.4)
    sums = [[], []]
    for c, name in enumerate(["1", "4", "6", "2", "3", "5"]):
        wet = c > 2
        at = {"specimen": name}
        s.put(5, 2 + c, int(name))
        dry, water, ssd, gmb = mix.masses(5.4, voids=7.0, mass=3820)
        height = rounded((ssd - water) / (3.14159 / 4 * 15 * 15) / 2.54, 2)
        strength_psi = (104 if wet else 118) + mix.noise(3)
        load = round(strength_psi * 3.14159 * height * 5.906 / 2 / 5) * 5
        s.read(6, 2 + c, "specimen-diameter", 5.91, at, unit="in", fmt="0.00")
        s.read(7, 2 + c, "specimen-thickness", height, at, unit="in", fmt="0.00")
        s.read(8, 2 + c, "mass-in-air", dry, at, fmt="0.0")
        s.read(9, 2 + c, "mass-saturated-surface-dry", ssd, at, fmt="0.0")
        s.read(10, 2 + c, "mass-in-water", water, at, fmt="0.0")
        s.read(11, 2 + c, "air-voids", rounded(100 * (1 - gmb / gmm), 1), at, fmt="0.0")
        if wet:
            s.read(12, 2 + c, "degree-of-saturation", rounded(75 + mix.noise(2), 1), at, fmt="0.0")
        else:
            s.put(12, 2 + c, "-")
        s.read(13, 2 + c, "failure-load", load, at, unit="lbf", fmt="#,##0")
        value = rounded(2 * load / (3.14159265 * height * 5.91), 1)
        sums[wet].append(value)
        quantity = "tensile-strength-conditioned" if wet else "tensile-strength-dry"
        s.read(14, 2 + c, quantity, value, at, unit="psi", fmt="0.0")
    s.put(15, 1, "Average Strength, psi", bold=True)
    s.put(15, 2, rounded(mean(sums[0]), 1)).merge(15, 2, 3).put(15, 5, rounded(mean(sums[1]), 1)).merge(15, 5, 3)
    s.put(17, 1, "TSR, %", bold=True).read(17, 2, "tensile-strength-ratio", round(100 * mean(sums[1]) / mean(sums[0])))
    s.put(18, 1, "Min. required, %").put(18, 2, 80)


def tollhouse():
    book = Book(UNITS)
    mix = Mix(1202, 5.1, 2.702, absorption=0.62, gb=1.026, dust=5.4, mass=4810)
    g = book.sheet("Gyratory")
    g.put(1, 1, "Tollhouse Asphalt", bold=True).put(2, 1, "Gyratory compaction and bulk density, 100 gyrations")
    g.put(4, 1, "Pb").put(4, 2, "Specimen").put(4, 3, "Height (mm) at gyrations").merge(4, 3, 3)
    g.put(4, 6, "Mass (g)").merge(4, 6, 3).put(4, 9, "Gmb").put(4, 10, "Gmm").put(4, 11, "%Gmm at gyrations").merge(4, 11, 3)
    g.put(4, 14, "Va")
    g.put(5, 1, "(%)").row(5, 3, [8, 100, 160]).row(5, 6, ["dry", "in water", "SSD"]).row(5, 11, [8, 100, 160]).put(5, 14, "(%)")
    g.put(5, 9, "(-)").put(5, 10, "(-)")
    row = 7
    rice = book.sheet("Rice")
    rice.row(1, 1, ["Max. theoretical specific gravity, AASHTO T 209 (bowl in water)"], bold=True)
    rice.row(3, 1, ["Pb (%)", "Sample", "Mass of dry sample in air (g)", "Mass of bowl in water (g)",
                    "Mass of bowl + sample in water (g)", "Gmm"])
    rice_row = 4
    for pb in [4.6, 5.1, 5.6, 6.1]:
        trial = str(pb)
        gmms = []
        for n in (1, 2):
            gmm = mix.true_gmm(pb) + mix.noise(0.003)
            a = rounded(2215 + mix.noise(12), 1)
            bowl = 1286.4
            c = rounded(bowl + a - a / gmm, 1)
            value = a / (a - (c - bowl))
            if n == 1:
                rice.put(rice_row, 1, pb)
            at = {"trial": trial, "specimen": str(n)}
            rice.put(rice_row, 2, n).row(rice_row, 3, [a, bowl, c], fmt="0.0")
            rice.read(rice_row, 6, "maximum-specific-gravity", value, at, fmt="0.000",
                      formula=f"=C{rice_row}/(C{rice_row}-(E{rice_row}-D{rice_row}))")
            gmms.append(value)
            rice_row += 1
        rice.put(rice_row, 5, "mean", italic=True).put(rice_row, 6, mean(gmms), fmt="0.000", bold=True,
                                                       formula=f"=AVERAGE(F{rice_row - 2}:F{rice_row - 1})")
        mean_row = rice_row
        rice_row += 2
        first = row
        for n in (1, 2):
            at = {"trial": trial, "specimen": str(n)}
            dry, water, ssd, gmb = mix.masses(pb)
            va100 = 100 * gmb / mean(gmms)
            h100 = rounded((ssd - water) / 176.71 * 10, 1)
            h8 = rounded(h100 * (va100 / (va100 - 9.8 + mix.noise(0.15))), 1)
            h160 = rounded(h100 * (va100 / (va100 + 1.1 + mix.noise(0.05))), 1)
            if n == 1:
                g.read(row, 1, "binder-content", pb, {"trial": trial}, fmt="0.0").merge(row, 1, 1, 2)
            g.put(row, 2, n)
            for c, (height, gyrations) in enumerate([(h8, 8), (h100, 100), (h160, 160)]):
                g.read(row, 3 + c, "specimen-height", height, {**at, "gyrations": gyrations}, fmt="0.0")
                back = gmb / mean(gmms) * 100 * h100 / height
                g.read(row, 11 + c, "relative-density", back, {**at, "gyrations": gyrations}, fmt="0.0",
                       formula=f"=I{row}/J{row}*100*D{row}/{'CDE'[c]}{row}")
            g.read(row, 6, "mass-in-air", dry, at, fmt="0.0").read(row, 7, "mass-in-water", water, at, fmt="0.0")
            g.read(row, 8, "mass-saturated-surface-dry", ssd, at, fmt="0.0")
            g.read(row, 9, "bulk-specific-gravity-mix", gmb, at, fmt="0.000", formula=f"=F{row}/(H{row}-G{row})")
            g.maybe(row, 10, "maximum-specific-gravity", mean(gmms), {"trial": trial}, fmt="0.000", formula=f"=Rice!F{mean_row}")
            g.read(row, 14, "air-voids", 100 * (1 - gmb / mean(gmms)), at, fmt="0.0", formula=f"=100*(1-I{row}/J{row})")
            row += 1
        g.put(row, 2, "Mean", italic=True)
        for c in (9, 12, 14):
            letter = address(1, c)[0]
            g.put(row, c, 0.0, italic=True, fmt="0.000" if c == 9 else "0.0", formula=f"=AVERAGE({letter}{first}:{letter}{row - 1})")
        row += 2
    hamburg(book, mix)
    return book, lambda path: with_office(book, path)


def hamburg(book, mix):
    s = book.sheet("HWTT")
    s.put(1, 1, "Hamburg wheel tracking, AASHTO T 324").put(2, 1, "Test temperature").put(2, 3, 50).put(2, 4, "°C")
    s.put(3, 1, "Binder content").maybe(3, 3, "binder-content", 5.1, {}).put(3, 4, "%").put(4, 1, "Specimen voids").put(4, 3, "7.0 ± 0.5").put(4, 4, "%")
    s.put(6, 1, "Passes").put(6, 2, "Rut depth (mm)").merge(6, 2, 2).put(7, 2, "Left wheel").put(7, 3, "Right wheel")
    for r, passes in enumerate([1000, 2500, 5000, 7500, 10000, 12500, 15000, 17500, 20000], 8):
        s.put(r, 1, passes, fmt="#,##0")
        for c, wheel in enumerate(["Left wheel", "Right wheel"]):
            depth = 0.62 * (passes / 1000) ** 0.56 * (1.0 + 0.09 * c) + abs(mix.noise(0.03))
            s.read(r, 2 + c, "wheel-track-rut-depth", rounded(depth, 2),
                   {"specimen": wheel, "passes": passes, "temperature": 50}, fmt="0.00")
    s.put(18, 1, "Stripping inflection point (passes)").read(
        18, 2, "stripping-inflection-point", 20000, {"specimen": "Left wheel", "temperature": 50}, text="> 20 000", qualifier=">")
    s.read(18, 3, "stripping-inflection-point", 20000, {"specimen": "Right wheel", "temperature": 50}, text="> 20 000", qualifier=">")
    s.put(19, 1, "Requirement: max. 12.5 mm at 20 000 passes", italic=True)


BOOKS = {"01-brightwater-central": brightwater, "02-tollhouse-gyratory": tollhouse}
