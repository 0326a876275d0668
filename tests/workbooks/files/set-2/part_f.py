"""Densification curves, a fracture laboratory, aggregate bench sheets with masses, a French performance sheet."""

import math

from files import UNITS, with_office, with_openpyxl
from lab import Book
from mixes import Mix, mean, rounded

GYRATIONS = [5, 8, 10, 15, 20, 30, 40, 50, 60, 75, 90, 100]


def densification():
    """A sheet for each binder content, gyrations down, heights and densities of three specimens across."""
    book = Book(UNITS)
    mix = Mix(2619, 5.2, 2.66, absorption=0.5)
    info = book.sheet("Info")
    info.put(1, 1, "Brightwater mobile laboratory").put(2, 1, "Ninit / Ndes / Nmax")
    for k, (quantity, value) in enumerate([("gyrations-initial", 8), ("gyrations-design", 100), ("gyrations-maximum", 160)]):
        info.maybe(2, 3, quantity, value, {}, text="8 / 100 / 160", part=k)
    for r, (pb, letter) in enumerate([(4.7, "A"), (5.2, "B"), (5.7, "C")]):
        name = f"Pb={pb}%"
        s = book.sheet(name)
        gmm = mix.gmm(pb)
        s.put(1, 1, "Gyratory densification data").put(2, 1, "Binder content, %").read(2, 3, "binder-content", pb, {"trial": str(pb)}, fmt="0.0")
        s.put(3, 1, "Gmm").read(3, 3, "maximum-specific-gravity", gmm, {"trial": str(pb)}, fmt="0.000")
        s.put(4, 1, "Gmb (est. corrected)")
        s.put(6, 1, "No. of").put(6, 2, "Height, mm").merge(6, 2, 3).put(6, 5, "% Gmm").merge(6, 5, 3).put(6, 8, "Avg. % Gmm")
        s.put(7, 1, "gyrations").row(7, 2, ["S1", "S2", "S3"]).row(7, 5, ["S1", "S2", "S3"])
        final = [96.0 + 1.9 * (pb - 5.2) + mix.noise(0.25) for _ in range(3)]
        ends = [rounded(111.5 + mix.noise(0.3), 1) for _ in range(3)]
        for k in range(3):
            s.read(4, 2 + k, "bulk-specific-gravity-mix", rounded(gmm * final[k] / 100, 3), {"trial": str(pb), "specimen": f"S{k + 1}"}, fmt="0.000")
        for row, n in enumerate(GYRATIONS, 8):
            s.put(row, 1, n)
            density = []
            for k in range(3):
                at = {"trial": str(pb), "specimen": f"S{k + 1}", "gyrations": n}
                value = final[k] - 8.9 * math.log10(100 / n) * 0.92
                height = rounded(ends[k] * final[k] / value, 1)
                value = rounded(final[k] * ends[k] / height, 1)
                density.append(value)
                s.read(row, 2 + k, "specimen-height", height, at, fmt="0.0").read(row, 5 + k, "relative-density", value, at, fmt="0.0")
            s.put(row, 8, rounded(mean(density), 1), fmt="0.0")
    book.note("Row 4 holds the specimens' bulk gravities above the columns of their heights, not in one labelled table.")
    for reading in list(book.readings):
        if reading["quantity"] == "bulk-specific-gravity-mix":
            book.readings.remove(reading)
            book.optional.append(reading)
    return book, lambda path: with_office(book, path)


def fracture():
    """One test a block down a sheet; temperatures and conditioning in the block titles."""
    book = Book(UNITS)
    mix = Mix(2620, 5.3, 2.66)
    s = book.sheet("Cracking & rutting")
    s.put(1, 1, "PERFORMANCE TESTING - KD-12.5-P4", bold=True)
    s.put(3, 1, "A. Disk-shaped compact tension, −18 °C", bold=True).row(4, 1, ["Replicate", "Air voids (%)", "Fracture energy (J/m²)"])
    for n in range(1, 5):
        s.put(4 + n, 1, n).read(4 + n, 2, "air-voids", rounded(7 + mix.noise(0.2), 1), {"specimen": str(n)}, optional=True)
        s.read(4 + n, 3, "disk-fracture-energy", round(512 + mix.noise(35)), {"specimen": str(n), "temperature": -18})
    s.put(9, 1, "Average").put(9, 3, 511).put(10, 1, "Requirement").put(10, 3, "≥ 400")
    s.put(12, 1, "B. Loaded wheel tester (APA), 64 °C, 8000 cycles", bold=True).row(13, 1, ["Position", "Rut depth (mm)"])
    for r, name in enumerate(["Left", "Center", "Right"], 14):
        s.put(r, 1, name).read(r, 2, "loaded-wheel-rut-depth", rounded(3.6 + mix.noise(0.4), 2), {"specimen": name, "passes": 8000, "temperature": 64})
    s.put(17, 1, "Average").put(17, 2, 3.6)
    s.put(19, 1, "C. High-temperature indirect tension, 54 °C", bold=True).row(20, 1, ["Specimen", "Thickness (in.)", "Diameter (in.)", "Peak load (lbf)", "Strength (psi)"])
    for n in (1, 2, 3):
        t = rounded(2.44 + mix.noise(0.02), 2)
        load = round((28 + mix.noise(1)) * math.pi * t * 5.91 / 2)
        at = {"specimen": f"H{n}"}
        s.put(20 + n, 1, f"H{n}").read(20 + n, 2, "specimen-thickness", t, at, unit="in", fmt="0.00").read(20 + n, 3, "specimen-diameter", 5.91, at, unit="in")
        s.read(20 + n, 4, "failure-load", load, at, unit="lbf", may={"temperature": 54})
        s.read(20 + n, 5, "high-temperature-tensile-strength", rounded(2 * load / (math.pi * t * 5.91), 1), {**at, "temperature": 54}, unit="psi", fmt="0.0")
    s.put(25, 1, "D. Overlay tester, 25 °C", bold=True).row(26, 1, ["Specimen", "Cycles to failure", "Crack progression rate"])
    for n in (1, 2, 3):
        at, may = {"specimen": f"O{n}"}, {"temperature": 25}
        s.put(26 + n, 1, f"O{n}").read(26 + n, 2, "overlay-cycles", round(340 + mix.noise(60)), at, may=may)
        s.read(26 + n, 3, "crack-propagation-rate", rounded(0.41 + mix.noise(0.03), 2), at, may=may)
    s.put(31, 1, "Specimens short-term aged 4 h at 135 °C", italic=True)
    book.note("Replicates 1 to 4 of block A share marks with nothing else; their voids are optional.")
    for reading in book.readings:
        reading["may"] = {**reading.get("may", {}), "aging": "short-term"}
    return book, lambda path: with_openpyxl(book, path)


def benches():
    """Gravity benches of four stockpiles: masses of aggregate are not those of compacted specimens."""
    book = Book(UNITS)
    mix = Mix(2621, 5.3, 2.66)
    s = book.sheet("C127 coarse")
    s.put(1, 1, "SPECIFIC GRAVITY AND ABSORPTION OF COARSE AGGREGATE", bold=True)
    row = 3
    for name, gsb, absorption in [("Stone 78", 2.668, 0.7), ("Stone 57", 2.681, 0.6)]:
        s.put(row, 1, "Material:").put(row, 2, name, bold=True)
        s.row(row + 1, 1, ["", "Test 1", "Test 2", "Average"])
        s.down(row + 2, 1, ["A  Oven-dry mass, g", "B  SSD mass, g", "C  Mass in water, g", "Bulk SG (dry)  A/(B-C)", "Bulk SG (SSD)  B/(B-C)", "Apparent SG  A/(A-C)", "Absorption, %"])
        values = [[], [], [], []]
        for n in (1, 2):
            a = rounded(3015 + mix.noise(15), 1)
            b = rounded(a * (1 + (absorption + mix.noise(0.03)) / 100), 1)
            c = rounded(b - a / (gsb + mix.noise(0.006)), 1)
            s.down(row + 2, 1 + n, [a, b, c])
            results = [a / (b - c), b / (b - c), a / (a - c), 100 * (b - a) / a]
            at = {"stockpile": name, "specimen": str(n)}
            letter = "BC"[n - 1]
            A, B, C = (f"{letter}{row + k}" for k in (2, 3, 4))
            formulas = [f"={A}/({B}-{C})", f"={B}/({B}-{C})", f"={A}/({A}-{C})", f"=100*({B}-{A})/{A}"]
            for k, quantity in enumerate(["bulk-specific-gravity-aggregate", "saturated-surface-dry-specific-gravity-aggregate", "apparent-specific-gravity-aggregate", "water-absorption"]):
                values[k].append(results[k])
                s.read(row + 5 + k, 1 + n, quantity, results[k], at, fmt="0.00" if k == 3 else "0.000", formula=formulas[k])
        for k in range(4):
            s.put(row + 5 + k, 4, mean(values[k]), fmt="0.00" if k == 3 else "0.000", formula=f"=AVERAGE(B{row + 5 + k}:C{row + 5 + k})")
        row += 11
    f = book.sheet("C128 fine")
    f.put(1, 1, "FINE AGGREGATE - PYCNOMETER", bold=True)
    f.row(3, 1, ["Material", "Test", "Dry mass, g", "SSD mass, g", "Pyc.+water, g", "Pyc.+water+agg., g", "Gsb", "Gsb SSD", "Gsa", "Abs. %"])
    row = 4
    for name, gsb, absorption in [("Mfg. sand", 2.641, 1.1), ("River sand", 2.628, 0.6)]:
        for n in (1, 2):
            ssd = rounded(500.0 + mix.noise(0.6), 1)
            dry = rounded(ssd / (1 + (absorption + mix.noise(0.05)) / 100), 1)
            pyc = 1288.4
            both = rounded(pyc + ssd - dry / (gsb + mix.noise(0.008)), 1)
            at = {"stockpile": name, "specimen": str(n)}
            volume = pyc + ssd - both
            f.put(row, 1, name).put(row, 2, n).row(row, 3, [dry, ssd, pyc, both])
            for c, (quantity, value, fmt) in enumerate([("bulk-specific-gravity-aggregate", dry / volume, "0.000"), ("saturated-surface-dry-specific-gravity-aggregate", ssd / volume, "0.000"),
                                                        ("apparent-specific-gravity-aggregate", dry / (pyc + dry - both), "0.000"), ("water-absorption", 100 * (ssd - dry) / dry, "0.00")], 7):
                f.read(row, c, quantity, rounded(value, int(fmt.count("0")) - 1), at, fmt=fmt)
            row += 1
    t = book.sheet("Consensus")
    t.row(1, 1, ["Property", "Stone 78", "Stone 57", "Mfg. sand", "River sand"])
    rows = [("LA abrasion (%)", "abrasion-loss", [31, 28, None, None], {}), ("Soundness, MgSO4 (%)", "soundness-loss", [8.4, 6.9, 9.7, 5.1], {"variant": "magnesium"}),
            ("Uncompacted voids A (%)", "fine-aggregate-angularity", [None, None, 47.2, 41.3], {}), ("Sand equivalent (%)", "sand-equivalent", [None, None, 66, 82], {}),
            ("Clay lumps (%)", "deleterious-materials", [0.1, 0.2, 0.0, 0.3], {})]
    for r, (label, quantity, values, at) in enumerate(rows, 2):
        t.put(r, 1, label)
        for c, (pile, value) in enumerate(zip(["Stone 78", "Stone 57", "Mfg. sand", "River sand"], values), 2):
            if value is None:
                t.put(r, c, "n/a")
            else:
                t.read(r, c, quantity, value, {"stockpile": pile, **at})
    return book, lambda path: with_office(book, path)


def french():
    """Rutting in percent, complex modulus, water sensitivity in MPa; averages stand to the right."""
    book = Book(UNITS)
    mix = Mix(2622, 5.6, 2.7)
    s = book.sheet("Performances")
    s.put(1, 1, "EB 14 liaison 35/50 - essais de performance", bold=True)
    s.put(3, 1, "Tenue à l'eau (15 °C)", bold=True).row(4, 1, ["Éprouvette n°", 1, 2, 3, "Moyenne"])
    dry = [rounded(2.41 + mix.noise(0.05), 2) for _ in range(3)]
    wet = [rounded(2.09 + mix.noise(0.05), 2) for _ in range(3)]
    s.put(5, 1, "Résistance en traction indirecte, à sec (MPa)").put(6, 1, "Résistance en traction indirecte, après immersion (MPa)")
    for k in range(3):
        at, may = {"specimen": str(k + 1)}, {"temperature": 15}
        s.read(5, 2 + k, "tensile-strength-dry", dry[k], at, unit="MPa", fmt="0.00", may=may).read(6, 2 + k, "tensile-strength-conditioned", wet[k], at, unit="MPa", fmt="0.00", may=may)
    s.put(5, 5, mean(dry), fmt="0.00", formula="=AVERAGE(B5:D5)").put(6, 5, mean(wet), fmt="0.00", formula="=AVERAGE(B6:D6)")
    s.put(7, 1, "ITSR (%)").read(7, 5, "tensile-strength-ratio", 100 * mean(wet) / mean(dry), {}, fmt="0", formula="=100*E6/E5")
    s.put(9, 1, "Module de rigidité IT-CY à 15 °C (MPa)", bold=True).row(10, 1, ["Éprouvette n°", 1, 2, 3, 4, "Moyenne"]).put(11, 1, "Module (MPa)")
    for k in range(4):
        s.read(11, 2 + k, "indirect-tensile-stiffness", round(11800 + mix.noise(350)), {"specimen": str(k + 1), "temperature": 15})
    s.put(11, 6, 0, fmt="0", formula="=AVERAGE(B11:E11)")
    s.put(13, 1, "Bitume récupéré", bold=True).put(14, 1, "Pénétrabilité à 25 °C (1/10 mm)").maybe(14, 2, "penetration", 24, {"temperature": 25}).put(15, 1, "TBA (°C)").maybe(15, 2, "softening-point", 60.4, {})
    s.put(17, 1, "Granularité", bold=True).row(18, 1, ["Tamis (mm)", 0.063, 0.25, 2, 4, 6.3, 10, 14, 20]).put(19, 1, "Passant (%)")
    for c, (sieve, value) in enumerate(zip([0.063, 0.25, 2, 4, 6.3, 10, 14, 20], [6.6, 12, 33, 46, 56, 76, 96, 100]), 2):
        s.read(19, c, "percent-passing", value, {"sieve": sieve})
    s.put(21, 1, "Teneur en liant (%)").read(21, 2, "binder-content", 5.1, {}).put(22, 1, "Fatigue ε6 (µdéf)").put(22, 2, 118)
    return book, lambda path: with_office(book, path)


BOOKS = {"19-densification": densification, "20-fracture-laboratory": fracture, "21-aggregate-benches": benches, "22-performances-fr": french}
