"""A whole submittal of one more laboratory: cover, stockpiles, specimens in rows, summary, all in SI."""

import datetime

from files import UNITS, with_office
from lab import Book
from mixes import Mix, blend_of, harmonic, mean, rounded

SIEVES = [0.075, 0.15, 0.3, 0.6, 1.18, 2.36, 4.75, 9.5, 12.5, 19.0]
PILES = [
    ("CA1 - Ketter", 28, [0.7, 0.9, 1.0, 1.2, 1.4, 1.8, 4.6, 41, 86, 100], 2.731, 0.55, 2.786),
    ("CA2 - Ketter", 22, [0.9, 1.1, 1.3, 1.6, 2.1, 4.3, 33, 97, 100, 100], 2.724, 0.63, 2.780),
    ("FA1 - Ketter", 38, [8.9, 13.1, 20.4, 31, 46, 69, 97, 100, 100, 100], 2.702, 0.92, 2.774),
    ("FA2 - Ross", 12, [2.2, 6.9, 22.5, 55, 79, 92, 99, 100, 100, 100], 2.646, 0.60, 2.687),
]


def submittal():
    book = Book(UNITS)
    shares = [p[1] for p in PILES]
    gsb = rounded(harmonic(shares, [p[3] for p in PILES]), 3)
    blend = blend_of(shares, [p[2] for p in PILES], SIEVES)
    mix = Mix(2518, 5.0, gsb, absorption=0.45, gb=1.033, dust=blend[0], mass=4880)
    cover(book, mix, gsb)
    stockpiles(book, blend, gsb)
    results = specimens(book, mix)
    summary(book, mix, results)
    return book, lambda path: with_office(book, path)


def cover(book, mix, gsb):
    s = book.sheet("Cover sheet")
    s.put(4, 3, "BITUMINOUS MIXTURE DESIGN", bold=True).merge(4, 3, 5)
    s.put(7, 3, "Mixture code").put(8, 3, "BW 12.5 M").put(7, 5, "Layer").put(8, 5, "Binder course").put(7, 7, "Bitumen grade").put(8, 7, "PG 58-28")
    s.put(10, 3, "Nominal maximum aggregate size [mm]").put(11, 3, 12.5).put(10, 5, "Traffic [million ESAL]").put(11, 5, 1.8)
    for name, value in [("course", "binder"), ("binderGrade", "PG 58-28"), ("nominalMaximumSize", 12.5), ("designTraffic", 1.8)]:
        book.know(name, value)
    s.put(10, 7, "N design").read(11, 7, "gyrations-design", 65, {})
    s.put(14, 3, "Design bitumen content").put(14, 5, "%").read(14, 6, "binder-content", 5.0, {"trial": "design"}, fmt="0.0")
    s.put(15, 3, "Bitumen density at 25 °C").put(15, 5, "-").read(15, 6, "binder-specific-gravity", 1.033, {}, fmt="0.000", may={"temperature": 25})
    s.put(16, 3, "Mixing temperature").put(16, 5, "°C").read(16, 6, "mixing-temperature", 152, {})
    s.put(17, 3, "Compaction temperature").put(17, 5, "°C").read(17, 6, "compaction-temperature", 141, {})
    s.put(20, 3, "Prepared").put(20, 5, datetime.date(2026, 1, 30), fmt="d mmmm yyyy")


def stockpiles(book, blend, gsb):
    s = book.sheet("Aggregates")
    s.put(2, 2, "Sieve (mm)").merge(2, 2, 1, 2)
    s.put(2, 3, "Stockpile, % passing").merge(2, 3, 4).put(2, 8, "Design").put(2, 9, "Envelope").merge(2, 9, 2)
    for c, (name, *_rest) in enumerate(PILES, 3):
        s.put(3, c, name, wrap=True)
    s.put(3, 8, "blend").row(3, 9, ["from", "to"])
    envelope = {0.075: (2, 8), 2.36: (28, 58), 9.5: (None, 90), 12.5: (90, 100), 19.0: (100, 100)}
    for r, sieve in enumerate(SIEVES, 5):
        s.put(r, 2, sieve)
        for c, pile in enumerate(PILES, 3):
            s.read(r, c, "percent-passing", pile[2][r - 5], {"stockpile": pile[0], "sieve": sieve}, fmt="0.0")
        s.read(r, 8, "percent-passing", blend[r - 5], {"trial": "design", "sieve": sieve}, fmt="0.0")
        low, high = envelope.get(sieve, (None, None))
        s.put(r, 9, low).put(r, 10, high)
    rows = [("Proportion (%)", "stockpile-share", 1, "0"), ("Bulk rel. density", "bulk-specific-gravity-aggregate", 3, "0.000"),
            ("Apparent rel. density", "apparent-specific-gravity-aggregate", 5, "0.000"), ("Water absorption (%)", "water-absorption", 4, "0.00")]
    for r, (label, quantity, field, fmt) in enumerate(rows, 17):
        s.put(r, 2, label)
        for c, pile in enumerate(PILES, 3):
            s.read(r, c, quantity, pile[field], {"stockpile": pile[0]}, fmt=fmt)
    s.put(17, 8, 100, formula="=SUM(C17:F17)")
    s.read(18, 8, "bulk-specific-gravity-aggregate", gsb, {}, fmt="0.000")
    s.read(19, 8, "apparent-specific-gravity-aggregate", rounded(harmonic([p[1] for p in PILES], [p[5] for p in PILES]), 3), {}, fmt="0.000")
    s.read(20, 8, "water-absorption", rounded(sum(p[1] * p[4] for p in PILES) / 100, 2), {}, fmt="0.00")


def specimens(book, mix):
    s = book.sheet("Compaction data")
    s.put(1, 1, "Gyratory specimens", bold=True)
    s.put(3, 1, "ID").put(3, 2, "Bitumen").put(3, 3, "Mass").merge(3, 3, 3).put(3, 6, "Height at gyrations").merge(3, 6, 2)
    s.put(3, 8, "Bulk rel.\ndensity", wrap=True)
    s.put(4, 2, "%").row(4, 3, ["dry, g", "water, g", "SSD, g"]).put(4, 6, "7 (mm)").put(4, 7, "65 (mm)").put(4, 8, "Gmb")
    row, results = 6, []
    m = book.sheet("Max density")
    m.row(1, 1, ["Bitumen (%)", "Test", "Max. rel. density Gmm"])
    line = 2
    for letter, pb in zip("PQRS", [4.5, 5.0, 5.5, 6.0]):
        gmbs = []
        for n in (1, 2, 3):
            name = f"{letter}{n}"
            dry, water, ssd, gmb = mix.masses(pb, mass=4880)
            at = {"trial": str(pb), "specimen": name}
            height = rounded((ssd - water) / 17.671, 1)
            s.put(row, 1, name).read(row, 2, "binder-content", pb, {"trial": str(pb)}, may={"specimen": name}, fmt="0.0")
            s.read(row, 3, "mass-in-air", dry, at).read(row, 4, "mass-in-water", water, at).read(row, 5, "mass-saturated-surface-dry", ssd, at)
            s.read(row, 6, "specimen-height", rounded(height * 1.111 + mix.noise(0.2), 1), {**at, "gyrations": 7}).read(row, 7, "specimen-height", height, {**at, "gyrations": 65})
            s.read(row, 8, "bulk-specific-gravity-mix", gmb, at, fmt="0.000", formula=f"=C{row}/(E{row}-D{row})")
            gmbs.append(gmb)
            row += 1
        s.put(row, 1, f"Mean {letter}", italic=True).put(row, 8, 0, fmt="0.000", formula=f"=AVERAGE(H{row - 3}:H{row - 1})")
        row += 2
        gmms = [mix.gmm(pb), mix.gmm(pb)]
        for n in (1, 2):
            m.put(line, 1, pb).put(line, 2, n)
            m.read(line, 3, "maximum-specific-gravity", gmms[n - 1], {"trial": str(pb), "specimen": str(n)}, fmt="0.000")
            line += 1
        results.append((str(pb), pb, mean(gmbs), mean(gmms)))
    book.note("Specimens P1 to S3 show their trial by letter; the workbook names trials by content alone. Calling them P to S everywhere is not wrong.")
    return results


def summary(book, mix, results):
    s = book.sheet("Summary")
    s.put(1, 1, "Mixture properties", bold=True)
    s.row(3, 1, ["Bitumen content (%)", "Air voids (%)", "VMA (%)", "VFB (%)", "Eff. bitumen (%)", "Dust / eff. bitumen", "%Gmm at Nini"])
    for r, (trial, pb, gmb, gmm) in enumerate(results, 4):
        v = mix.volumetrics(pb, gmb, gmm)
        at = {"trial": trial}
        s.read(r, 1, "binder-content", pb, at, fmt="0.0").read(r, 2, "air-voids", rounded(v["va"], 1), at, fmt="0.0")
        s.read(r, 3, "voids-in-mineral-aggregate", rounded(v["vma"], 1), at, fmt="0.0").read(r, 4, "voids-filled-with-asphalt", rounded(v["vfa"], 0), at)
        s.read(r, 5, "effective-binder-content", rounded(v["pbe"], 2), at, fmt="0.00").read(r, 6, "dust-proportion", rounded(v["dp"], 2), at, fmt="0.00")
        s.read(r, 7, "relative-density", rounded(100 * gmb / gmm / 1.111, 1), {**at, "gyrations": "initial"}, fmt="0.0")
    s.put(9, 1, "Requirement").put(9, 2, "3.0 - 5.0").put(9, 3, "min 14.0").put(9, 7, "max 90.5")


BOOKS = {"18-whole-submittal": submittal}
