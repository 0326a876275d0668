"""Reports beside the design: aggregates and binder, cracking and modulus, production, sieving, stone mastic."""

import datetime
import random

from files import UNITS, with_office, with_openpyxl, with_xlsxwriter
from lab import Book
from mixes import Mix, blend_of, mean, rounded


def materials():
    book = Book(UNITS)
    s = book.sheet("Aggregate Tests")
    s.put(2, 2, "AGGREGATE QUALITY - DESIGN BLEND", bold=True).merge(2, 2, 4)
    s.row(4, 2, ["Test", "Method", "Units", "Result", "Spec."], bold=True)
    rows = [
        ("Coarse agg. angularity, 1 or more fractured faces", "D5821", "%", "coarse-aggregate-angularity-one-face", 98, {}, "95 min"),
        ("Coarse agg. angularity, 2 or more fractured faces", "D5821", "%", "coarse-aggregate-angularity-two-faces", 94, {}, "90 min"),
        ("Fine aggregate angularity (uncompacted voids)", "T 304", "%", "fine-aggregate-angularity", 45.8, {}, "45 min"),
        ("Flat & elongated (5:1)", "D4791", "%", "flat-and-elongated", 2.4, {"variant": "5:1"}, "10 max"),
        ("Sand equivalent", "T 176", "%", "sand-equivalent", 61, {}, "45 min"),
        ("L.A. abrasion loss", "T 96", "%", "abrasion-loss", 24, {}, "40 max"),
        ("Micro-Deval loss", "T 327", "%", "micro-deval-loss", 11.3, {}, "18 max"),
        ("Sodium sulfate soundness, 5 cycles", "T 104", "%", "soundness-loss", 3.7, {"variant": "sodium"}, "12 max"),
        ("Clay lumps and friable particles", "T 112", "%", "deleterious-materials", 0.2, {}, "1.0 max"),
        ("Plasticity index", "T 90", None, "plasticity-index", None, {}, "NP"),
    ]
    for r, (label, method, unit, quantity, value, at, spec) in enumerate(rows, 5):
        s.put(r, 2, label).put(r, 3, method).put(r, 4, unit)
        if value is None:
            s.put(r, 5, "NP")
        else:
            s.read(r, 5, quantity, value, at)
        s.put(r, 6, spec)
    book.note("The plasticity index is NP, a result without a number; it stands outside the scored readings.")
    b = book.sheet("Binder")
    b.put(1, 1, "PERFORMANCE GRADED BINDER - CERTIFICATE OF ANALYSIS", bold=True).merge(1, 1, 5)
    b.put(3, 1, "Grade").put(3, 3, "PG 70-22").put(4, 1, "Date of certificate").put(4, 3, datetime.date(2026, 2, 11), fmt="d-mmm-yyyy")
    book.know("binderGrade", "PG 70-22")
    book.document("binder-certificate", "2026-02-11", None)
    b.row(6, 1, ["Property", "Method", "Unit", "Test temp., °C", "Result", "Limit"], bold=True)
    lines = [
        ("Original binder", None, None, None, None, None, None, None),
        ("Specific gravity", "T 228", "-", None, "binder-specific-gravity", 1.033, {}, "report"),
        ("Flash point", "T 48", "°C", None, "flash-point", 296, {}, "230 min"),
        ("Rotational viscosity", "T 316", "Pa·s", 135, "rotational-viscosity", 0.89, {}, "3.0 max"),
        ("Rotational viscosity", "T 316", "Pa·s", 165, "rotational-viscosity", 0.24, {}, "-"),
        ("G*/sin δ", "T 315", "kPa", 70, "rutting-parameter", 1.38, {"aging": "original"}, "1.00 min"),
        ("RTFO residue", None, None, None, None, None, None, None),
        ("Mass change", "T 240", "%", None, "mass-change", -0.214, {}, "±1.00"),
        ("G*/sin δ", "T 315", "kPa", 70, "rutting-parameter", 3.07, {"aging": "RTFO"}, "2.20 min"),
        ("PAV residue", None, None, None, None, None, None, None),
        ("G*·sin δ", "T 315", "kPa", 28, "fatigue-parameter", 3120, {}, "5000 max"),
        ("Creep stiffness, 60 s", "T 313", "MPa", -12, "creep-stiffness", 187, {}, "300 max"),
        ("m-value, 60 s", "T 313", "-", -12, "creep-rate", 0.331, {}, "0.300 min"),
    ]
    for r, (label, method, unit, temperature, quantity, value, at, limit) in enumerate(lines, 7):
        b.put(r, 1, label, bold=quantity is None).put(r, 2, method).put(r, 3, unit).put(r, 4, temperature).put(r, 6, limit)
        if quantity:
            conditions = dict(at)
            if temperature is not None:
                conditions["temperature"] = temperature
            may = {}
            if quantity in ("fatigue-parameter", "creep-stiffness", "creep-rate"):
                may = {"aging": "PAV"}
            if quantity == "mass-change":
                may = {"aging": "RTFO"}
            if label.endswith("60 s"):
                may["time"] = 60
            b.read(r, 5, quantity, value, conditions, may=may or None)
    d = book.sheet("Documents")
    d.row(1, 1, ["Enclosure", "No.", "Issued", "Valid until"], bold=True)
    papers = [
        ("Laboratory accreditation", "TL-114", datetime.date(2025, 6, 2), datetime.date(2027, 6, 1), "laboratory-accreditation"),
        ("Technician certificate", "T-2231", datetime.date(2024, 11, 18), datetime.date(2027, 11, 17), "technician-certificate"),
        ("Aggregate source approval", "CV-Q-07", datetime.date(2026, 1, 12), None, "aggregate-source-approval"),
    ]
    for r, (name, number, issued, valid, kind) in enumerate(papers, 2):
        d.put(r, 1, name).put(r, 2, number).put(r, 3, issued, fmt="dd mmm yyyy").put(r, 4, valid, fmt="dd mmm yyyy")
        book.document(kind, issued.isoformat(), valid.isoformat() if valid else None)
    return book, lambda path: with_openpyxl(book, path, date1904=True)


def cracking():
    book = Book(UNITS)
    rng = random.Random(1412)
    s = book.sheet("CT Index")
    s.put(1, 1, "IDEAL cracking test results, 25 °C", bold=True)
    s.row(3, 1, ["Specimen", "Thickness (mm)", "Diameter (mm)", "Air voids (%)", "Peak load (kN)", "Gf (J/m²)", "|m75| (N/m)",
                 "l75 (mm)", "CTindex"])
    values = []
    for n in range(1, 6):
        t, d = rounded(62 + rng.gauss(0, 0.3), 1), 150.0
        gf = round(8900 + rng.gauss(0, 500))
        m = round(6.4e6 + rng.gauss(0, 3e5), -4)
        l = rounded(4.6 + rng.gauss(0, 0.2), 2)
        ct = rounded(t / 62 * l / d * gf / m * 1e6, 1)
        values.append(ct)
        at, warm = {"specimen": str(n)}, {"temperature": 25}
        s.put(3 + n, 1, n).read(3 + n, 2, "specimen-thickness", t, at).read(3 + n, 3, "specimen-diameter", d, at, fmt="0.0")
        s.read(3 + n, 4, "air-voids", rounded(7 + rng.gauss(0, 0.2), 1), at)
        s.read(3 + n, 5, "failure-load", rounded(15.4 + rng.gauss(0, 0.5), 2), at, may=warm)
        s.read(3 + n, 6, "fracture-energy", gf, at, may=warm)
        s.maybe(3 + n, 7, "post-peak-slope", m / 1e6, at, unit="kN/mm", text=int(m), may=warm)
        s.read(3 + n, 8, "post-peak-displacement", l, at, may=warm)
        s.read(3 + n, 9, "cracking-tolerance-index", ct, at, may=warm)
    for reading in book.optional:
        reading["written"] = int(reading["written"])
        reading["writtenUnit"] = "N/m"
    s.put(9, 1, "Average").put(9, 9, rounded(mean(values), 1)).put(10, 1, "Std. dev.").put(10, 9, 6.1)
    s.put(11, 1, "COV, %").put(11, 9, 8.2)
    e = book.sheet("E-star")
    e.put(1, 1, "Dynamic modulus |E*|, MPa (mean of 3 specimens)", bold=True)
    e.put(3, 1, "Temp. (°C)").put(3, 2, "Frequency (Hz)").merge(3, 2, 6).row(4, 2, [25, 10, 5, 1, 0.5, 0.1])
    base = {4: 14200, 20: 6900, 40: 1450}
    for r, (temperature, top) in enumerate(base.items(), 5):
        e.put(r, 1, temperature)
        for c, frequency in enumerate([25, 10, 5, 1, 0.5, 0.1], 2):
            slope = {4: 0.09, 20: 0.17, 40: 0.27}[temperature]
            value = round(top * (frequency / 25) ** slope * (1 + rng.gauss(0, 0.006)))
            e.read(r, c, "dynamic-modulus", value, {"temperature": temperature, "frequency": frequency}, fmt="#,##0")
    v = book.sheet("Verification")
    v.put(1, 1, "Comparison of contractor and agency results at the design binder content", bold=True)
    v.row(3, 1, ["Property", "Contractor", "Agency", "Difference", "Allowed"])
    pairs = [
        ("Binder content, %", "binder-content", 5.3, 5.36, 0.3), ("Gmm", "maximum-specific-gravity", 2.492, 2.486, 0.018),
        ("Gmb", "bulk-specific-gravity-mix", 2.392, 2.401, 0.022), ("Air voids, %", "air-voids", 4.0, 3.4, 1.0),
        ("VMA, %", "voids-in-mineral-aggregate", 14.9, 14.6, 1.0), ("Passing 0.075 mm, %", "percent-passing", 5.1, 5.6, 1.5),
    ]
    for r, (label, quantity, ours, theirs, allowed) in enumerate(pairs, 4):
        at = {"sieve": 0.075} if quantity == "percent-passing" else {}
        v.put(r, 1, label).read(r, 2, quantity, ours, at).read(r, 3, quantity, theirs, {**at, "laboratory": "agency"})
        v.put(r, 4, rounded(abs(ours - theirs), 3)).put(r, 5, allowed)
    return book, lambda path: with_xlsxwriter(book, path, inline=True)


def production():
    book = Book(UNITS)
    mix = Mix(1413, 5.3, 2.651, absorption=0.5, dust=5.4)
    s = book.sheet("QC Lot 1")
    s.put(1, 1, "DAILY QC RESULTS - LOT 1", bold=True).put(2, 1, "Mix BW-9.5-S6, Ndes 65")
    s.row(4, 1, ["Sublot", "Date", "AC, %", "Gmm", "Gmb", "Va, %", "VMA, %", "P#200, %", "P#8, %"])
    for n in range(1, 6):
        pb = rounded(5.3 + mix.noise(0.12), 2)
        gmm, gmb = mix.gmm(pb), rounded(mix.gmb(pb, voids=4.0, sd=0.009), 3)
        v = mix.volumetrics(pb, gmb, gmm)
        at = {"specimen": f"1-{n}"}
        s.put(4 + n, 1, f"1-{n}").put(4 + n, 2, datetime.date(2026, 4, 13 + n), fmt="mm/dd/yy")
        s.read(4 + n, 3, "binder-content", pb, at, fmt="0.00").read(4 + n, 4, "maximum-specific-gravity", gmm, at, fmt="0.000")
        s.read(4 + n, 5, "bulk-specific-gravity-mix", gmb, at, fmt="0.000")
        s.read(4 + n, 6, "air-voids", rounded(v["va"], 1), at, fmt="0.0")
        s.read(4 + n, 7, "voids-in-mineral-aggregate", rounded(v["vma"], 1), at, fmt="0.0")
        s.read(4 + n, 8, "percent-passing", rounded(5.4 + mix.noise(0.3), 1), {**at, "sieve": 0.075}, fmt="0.0")
        s.read(4 + n, 9, "percent-passing", round(44 + mix.noise(2)), {**at, "sieve": 2.36})
    for r, label in enumerate(["Average", "Std. Dev.", "JMF target", "Tolerance ±"], 10):
        s.put(r, 1, label, bold=True)
    s.row(10, 3, [5.29, 2.478, 2.379, 4.0, 15.1, 5.4, 44]).row(11, 3, [0.11, 0.004, 0.009, 0.4, 0.3, 0.3, 2])
    s.row(13, 3, [0.3, 0.02, None, 1.0, 1.0, 1.5, 5])
    s.read(12, 3, "binder-content", 5.3, {"trial": "design"}, optional=True)
    s.maybe(12, 8, "percent-passing", 5.4, {"trial": "design", "sieve": 0.075})
    s.maybe(12, 9, "percent-passing", 44, {"trial": "design", "sieve": 2.36})
    s.maybe(12, 6, "air-voids", 4.0, {"trial": "design"})
    c = book.sheet("Cores")
    c.put(1, 1, "IN-PLACE DENSITY OF CORES - LOT 1", bold=True).put(2, 1, "Lot average Gmm").put(2, 4, 2.478)
    c.row(4, 1, ["Core ID", "Station", "Offset, ft", "Thickness, in.", "Core Gmb", "% Gmm", "In-place voids, %"])
    for n in range(1, 9):
        gmb = rounded(2.478 * (0.937 + mix.noise(0.009)), 3)
        at = {"specimen": f"C{n}"}
        c.put(4 + n, 1, at["specimen"]).put(4 + n, 2, f"{112 + 3 * n}+{25 * n % 100:02d}").put(4 + n, 3, [6, 9, 3, 11, 5, 8, 2, 10][n - 1])
        c.maybe(4 + n, 4, "lift-thickness", rounded(2.05 + mix.noise(0.1), 2), at, unit="in")
        c.maybe(4 + n, 5, "bulk-specific-gravity-mix", gmb, at, fmt="0.000")
        c.read(4 + n, 6, "field-density", rounded(100 * gmb / 2.478, 1), at, fmt="0.0", may={"variant": "maximum"})
        c.read(4 + n, 7, "in-place-air-voids", rounded(100 - 100 * gmb / 2.478, 1), at, fmt="0.0")
    c.put(13, 1, "Mean").put(13, 6, 93.6).put(13, 7, 6.4).put(14, 1, "PWL (92.0 - 97.0)").put(14, 6, 94)
    book.note("The thickness of a core is its own or the lift's: optional, as is the gravity of a core.")
    return book, lambda path: with_xlsxwriter(book, path)


def sieving():
    book = Book(UNITS, flat=True)
    rng = random.Random(1414)
    s = book.sheet("Sieve")
    s.put(1, 1, "Sieve analysis of extracted aggregate (T 30)").put(2, 1, "Sample: cold feed 14").put(3, 1, "Total dry mass, g").put(3, 2, 2104.6)
    s.row(5, 1, ["Sieve", "Mass retained, g", "% Retained", "Cum. % Retained", "% Passing"])
    masses = [0, 61.3, 344.2, 486.0, 391.7, 262.5, 201.4, 148.9, 84.2]
    names = ['3/4"', '1/2"', '3/8"', "No. 4", "No. 8", "No. 16", "No. 30", "No. 50", "No. 200"]
    openings = [19.0, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.075]
    total, gone = 2104.6, 0.0
    for r, (name, opening, mass) in enumerate(zip(names, openings, masses), 6):
        share = rounded(100 * mass / total, 1)
        gone += mass
        cumulative = rounded(100 * gone / total, 1)
        at = {"sieve": opening}
        s.put(r, 1, name).put(r, 2, mass).read(r, 3, "percent-retained", share, at)
        s.read(r, 4, "cumulative-percent-retained", cumulative, at).read(r, 5, "percent-passing", rounded(100 - cumulative, 1), at)
    s.put(15, 1, "Pan").put(15, 2, rounded(total - gone, 1)).put(15, 3, rounded(100 - 100 * gone / total, 1))
    s.put(16, 1, "Total").put(16, 2, total).put(16, 3, 100)
    return book, lambda path: with_office(book, path, "csv:Text - txt - csv (StarCalc):44,34,76,1,,0,false,true,false")


sieving.extension = ".csv"

PILES = ["12/16 chips", "8/12 chips", "Crushed fines", "Limestone filler"]
SMA = [19.0, 16.0, 12.5, 9.5, 4.75, 2.36, 0.6, 0.075]
GRADINGS = [[100, 97, 74, 22, 1.8, 1.3, 1.0, 0.6], [100, 100, 98, 62, 4.9, 2.0, 1.4, 0.8],
            [100, 100, 100, 100, 97, 66, 31, 9.8], [100, 100, 100, 100, 100, 100, 97, 78]]


def mastic():
    book = Book(UNITS)
    mix = Mix(1415, 6.4, 2.711, absorption=0.35, gb=1.034, target=4.0, slope=1.5)
    b = book.sheet("Trial blends")
    b.put(1, 1, "SMA 12.5 - TRIAL BLENDS", bold=True)
    b.row(3, 1, ["Stockpile", "Blend 1", "Blend 2", "Blend 3"], bold=True)
    shares = [[38, 40, 13, 9], [34, 42, 15, 9], [30, 44, 17, 9]]
    for r, name in enumerate(PILES, 4):
        b.put(r, 1, name)
        for c in range(3):
            b.read(r, 2 + c, "stockpile-share", shares[c][r - 4] / 100, {"blend": str(c + 1), "stockpile": name}, unit="fraction", fmt="0%")
    b.put(8, 1, "Total").row(8, 2, [1, 1, 1], fmt="0%")
    b.row(10, 1, ["Sieve, mm", "Blend 1", "Blend 2", "Blend 3", "Lower", "Upper"], bold=True)
    limits = [(100, 100), (None, None), (90, 99), (50, 85), (20, 40), (16, 28), (None, None), (8, 11)]
    for r, sieve in enumerate(SMA):
        b.put(11 + r, 1, sieve)
        for c in range(3):
            value = blend_of(shares[c], GRADINGS, SMA)[r]
            b.read(11 + r, 2 + c, "percent-passing", value, {"blend": str(c + 1), "sieve": sieve}, fmt="0.0")
        b.put(11 + r, 5, limits[r][0]).put(11 + r, 6, limits[r][1])
    b.put(20, 1, "Selected blend: 2")
    t = book.sheet("Design")
    t.put(1, 1, "SMA properties at trial binder contents, blend 2", bold=True)
    t.row(3, 1, ["", "5.9 %", "6.4 %", "6.9 %", "Criteria"])
    gmms = [rounded(mix.true_gmm(pb), 3) for pb in (5.9, 6.4, 6.9)]
    gmbs = [rounded(mix.gmb(pb), 3) for pb in (5.9, 6.4, 6.9)]
    rows = [("Gmm", "maximum-specific-gravity", gmms, "-"), ("Gmb", "bulk-specific-gravity-mix", gmbs, "-")]
    vols = [mix.volumetrics(pb, a, c) for pb, a, c in zip((5.9, 6.4, 6.9), gmbs, gmms)]
    rows += [("Air voids, %", "air-voids", [rounded(v["va"], 1) for v in vols], "4.0"),
             ("VMA, %", "voids-in-mineral-aggregate", [rounded(v["vma"], 1) for v in vols], "17.0 min."),
             ("VCAmix, %", "voids-in-coarse-aggregate-mix", [36.1, 36.4, 36.9], "< VCAdrc"),
             ("Draindown at 175 °C, %", "draindown", ["<0.05", "0.08*", "0.19*"], "0.30 max.")]
    for c, pb in enumerate((5.9, 6.4, 6.9)):
        t.read(3, 2 + c, "binder-content", pb, {"trial": str(pb)}, text=f"{pb} %", may={"blend": "2"})
    for r, (label, quantity, values, limit) in enumerate(rows, 4):
        t.put(r, 1, label).put(r, 5, limit)
        for c, value in enumerate(values):
            at = {"trial": str((5.9, 6.4, 6.9)[c])}
            if isinstance(value, str):
                t.read(r, 2 + c, quantity, float(value.strip("<*")), at, text=value, may={"temperature": 175, "blend": "2"},
                       qualifier="<" if "<" in value else None)
            else:
                t.read(r, 2 + c, quantity, value, at, may={"blend": "2"})
    t.put(10, 1, "Cantabro loss, %").row(10, 2, ["N/A", "N/A", "–"])
    t.put(11, 1, "TSR, %").put(11, 2, "ND").read(11, 3, "tensile-strength-ratio", 88.0, {"trial": "6.4"}, text="88.0", may={"blend": "2"}).put(11, 4, "ND").put(11, 5, "80 min.")
    t.put(13, 1, "VCAdrc, %").read(13, 2, "voids-in-coarse-aggregate-dry-rodded", 41.8, {})
    t.put(14, 1, "Fibre, % of mix").read(14, 2, "fibre-content", 0.3, {})
    t.put(15, 1, "* mean of two baskets", italic=True)
    h = book.sheet("Limits", hidden=True)
    h.row(1, 1, ["Property", "Min", "Max"]).row(2, 1, ["Va", 3.5, 4.5]).row(3, 1, ["VMA", 17.0]).row(4, 1, ["Draindown", None, 0.3])
    t.hidden_rows = [9]
    return book, lambda path: with_openpyxl(book, path)


BOOKS = {
    "11-materials-1904": materials,
    "12-cracking-and-modulus": cracking,
    "13-production-lot": production,
    "14-sieving": sieving,
    "15-stone-mastic": mastic,
}
