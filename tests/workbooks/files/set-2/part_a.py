"""An agency's verification, a gradation book by stockpile, and a volumetric book with trials side by side."""


from files import UNITS, with_office, with_xlsxwriter
from lab import Book
from mixes import Mix, blend_of, harmonic, mean, rounded


def verification():
    """Both parties under each property: two-row heads, split samples in rows."""
    book = Book(UNITS)
    mix = Mix(2101, 5.5, 2.648, absorption=0.6, gb=1.029, dust=5.6)
    s = book.sheet("Split samples")
    s.put(1, 1, "Carrow Valley Roads Authority - Materials Laboratory", bold=True).put(2, 1, "Verification of mix design BW-12.5-S8, Brightwater Paving")
    s.put(4, 1, "Split").merge(4, 1, 1, 2)
    groups = [
        ("Asphalt binder content (%)", "binder-content", 0.08, "0.00"), ("Max. specific gravity", "maximum-specific-gravity", 0.004, "0.000"),
        ("Bulk specific gravity", "bulk-specific-gravity-mix", 0.007, "0.000"), ("Air voids (%)", "air-voids", None, "0.0"),
        ("Voids in mineral aggregate (%)", "voids-in-mineral-aggregate", None, "0.0"), ("Passing No. 200 (%)", "percent-passing", 0.3, "0.0"),
    ]
    for g, (label, _quantity, _sd, _fmt) in enumerate(groups):
        s.put(4, 2 + 2 * g, label, bold=True, wrap=True).merge(4, 2 + 2 * g, 2)
        s.put(5, 2 + 2 * g, "Contractor").put(5, 3 + 2 * g, "CVRA" if g % 2 == 9 else "Agency")
    for n in range(1, 7):
        row = 5 + n
        s.put(row, 1, f"S-{n}")
        for party in (0, 1):
            pb = rounded(5.5 + mix.noise(0.08), 2)
            gmm = rounded(mix.true_gmm(5.5) + (0.003 if party else 0) + mix.noise(0.004), 3)
            gmb = rounded(mix.gmb(5.5, voids=4.0, sd=0.007), 3)
            v = mix.volumetrics(pb, gmb, gmm)
            values = [pb, gmm, gmb, rounded(v["va"], 1), rounded(v["vma"], 1), rounded(5.6 + mix.noise(0.25), 1)]
            for g, (value, (_label, quantity, _sd, fmt)) in enumerate(zip(values, groups)):
                at = {"specimen": f"S-{n}"}
                if quantity == "percent-passing":
                    at["sieve"] = 0.075
                if party:
                    at["laboratory"] = "agency"
                s.read(row, 2 + 2 * g + party, quantity, value, at, fmt=fmt)
    s.put(12, 1, "Mean", bold=True)
    for c in range(2, 14):
        letter = "ABCDEFGHIJKLMN"[c - 1]
        s.put(12, c, 0, bold=True, formula=f"=AVERAGE({letter}6:{letter}11)", fmt="0.000")
    s.put(13, 1, "F-test p").put(13, 2, 0.41).put(14, 1, "t-test p").put(14, 2, 0.28)
    return book, lambda path: with_office(book, path)


NAMES = ["25.0 (1\")", "19.0 (3/4\")", "12.5 (1/2\")", "9.5 (3/8\")", "4.75 (#4)", "2.36 (#8)", "1.18 (#16)", "0.600 (#30)", "0.300 (#50)",
         "0.150 (#100)", "0.075 (#200)"]
SIEVES = [25.0, 19.0, 12.5, 9.5, 4.75, 2.36, 1.18, 0.6, 0.3, 0.15, 0.075]
PILES = [
    ("Dalby 57s", 24, [100, 88, 36, 14, 3.0, 1.9, 1.6, 1.5, 1.3, 1.2, 0.9], 2.712, 0.48),
    ("Dalby 8s", 27, [100, 100, 100, 86, 19, 4.1, 2.6, 2.1, 1.8, 1.6, 1.3], 2.704, 0.61),
    ("Dalby Man. Sand", 31, [100, 100, 100, 100, 97, 68, 43, 27, 16, 9.1, 5.4], 2.689, 0.84),
    ("RAP -1/2", 18, [100, 100, 98, 91, 68, 50, 38, 29, 21, 14.2, 9.8], 2.661, 0.95),
]


def gradation_book():
    """One small table for each stockpile on one sheet; the target with sieves across on another."""
    book = Book(UNITS)
    s = book.sheet("Washed gradations")
    s.put(1, 1, "WASHED SIEVE ANALYSES (T 11 / T 27), average of 5", bold=True)
    for p, (name, share, passing, gsb, absorption) in enumerate(PILES):
        top, left = 3 + (p // 2) * 18, 1 + (p % 2) * 6
        s.put(top, left, name, bold=True).put(top, left + 2, "% of agg.").read(top, left + 3, "stockpile-share", share, {"stockpile": name})
        s.row(top + 1, left, ["Sieve, mm", "Wt. ret., g", "Cum. % ret.", "% passing"])
        total, before = 1500.0 + 37 * p, 100.0
        for r, (sieve, value) in enumerate(zip(NAMES, passing), top + 2):
            at = {"stockpile": name, "sieve": SIEVES[r - top - 2]}
            s.put(r, left, sieve).put(r, left + 1, rounded(total * (before - value) / 100, 1))
            s.read(r, left + 2, "cumulative-percent-retained", rounded(100 - value, 1), at, fmt="0.0")
            s.read(r, left + 3, "percent-passing", value, at, fmt="0.0")
            before = value
        s.put(top + 13, left, "Pan").put(top + 13, left + 1, rounded(total * before / 100, 1))
        s.put(top + 14, left, "Gsb").read(top + 14, left + 3, "bulk-specific-gravity-aggregate", gsb, {"stockpile": name}, fmt="0.000")
        s.put(top + 15, left, "Abs., %").read(top + 15, left + 3, "water-absorption", absorption, {"stockpile": name}, fmt="0.00")
    j = book.sheet("JMF")
    blend = blend_of([p[1] for p in PILES], [p[2] for p in PILES], SIEVES)
    j.put(1, 1, "JOB MIX FORMULA", bold=True)
    j.put(3, 1, "Sieve size").row(3, 2, ["1\"", "3/4\"", "1/2\"", "3/8\"", "#4", "#8", "#16", "#30", "#50", "#100", "#200"])
    j.put(4, 1, "Target % passing", bold=True)
    for c, (sieve, value) in enumerate(zip(SIEVES, blend), 2):
        j.read(4, c, "percent-passing", round(value) if sieve > 0.1 else value, {"trial": "design", "sieve": sieve})
    j.put(5, 1, "JMF tolerance").row(5, 2, [0, 5, 6, 6, 5, 4, 4, 4, 3, 2, 1.5])
    j.put(6, 1, "Control pts, low").row(6, 2, [100, 90, None, None, None, 23, None, None, None, None, 2])
    j.put(7, 1, "Control pts, high").row(7, 2, [None, 100, 90, None, None, 49, None, None, None, None, 8])
    j.put(9, 1, "Optimum AC, %").read(9, 2, "binder-content", 5.1, {"trial": "design"}, fmt="0.0")
    j.put(10, 1, "AC from RAP, %").put(10, 2, 0.9).put(11, 1, "RAP binder content, %").read(11, 2, "rap-binder-content", 5.0, {}, fmt="0.0")
    j.put(12, 1, "RBR").read(12, 2, "recycled-binder-ratio", 0.17, {}, fmt="0.00")
    j.put(13, 1, "Blend Gsb").read(13, 2, "bulk-specific-gravity-aggregate", rounded(harmonic([p[1] for p in PILES], [p[3] for p in PILES]), 3), {}, fmt="0.000")
    j.put(14, 1, "CAA (1 face / 2 faces), %")
    j.read(14, 2, "coarse-aggregate-angularity-one-face", 98, {}, text="98/95", part=0)
    j.read(14, 2, "coarse-aggregate-angularity-two-faces", 95, {}, text="98/95", part=1)
    j.put(15, 1, "F & E 5:1, %").read(15, 2, "flat-and-elongated", 1.9, {"variant": "5:1"}).put(16, 1, "F & E 3:1, %").read(16, 2, "flat-and-elongated", 11.2, {"variant": "3:1"})
    j.put(17, 1, "FAA, %").read(17, 2, "fine-aggregate-angularity", 46.1, {}).put(18, 1, "SE").read(18, 2, "sand-equivalent", 68, {})
    book.note("The two shares of faces stand in one cell.")
    return book, lambda path: with_xlsxwriter(book, path)


def side_by_side():
    """Trials in merged column groups, quantities in rows, percents as fractions, an old job in a hidden column, an error cell."""
    book = Book(UNITS)
    mix = Mix(2103, 5.6, 2.671, absorption=0.5, gb=1.030, dust=5.1, mass=4690)
    s = book.sheet("Vol")
    s.put(2, 2, "Tollhouse Asphalt - Superpave volumetrics", bold=True).put(3, 2, "all percentages by mass of mix unless stated", italic=True)
    contents = [5.1, 5.6, 6.1, 6.6]
    for t, pb in enumerate(contents):
        s.put(5, 4 + 3 * t, f"Point {t + 1}", bold=True).merge(5, 4 + 3 * t, 3).row(6, 4 + 3 * t, ["A", "B", "mean"])
    labels = [("Binder", "%"), ("Wt in air", "g"), ("Wt in water", "g"), ("Wt SSD", "g"), ("Bulk SG", None), ("Rice SG", None), ("VTM", "%"), ("VMA", "%"),
              ("VFA", "%"), ("Water absorption by vol.", "%")]
    for r, (label, unit) in enumerate(labels, 7):
        s.put(r, 2, label).put(r, 3, unit)
    for t, pb in enumerate(contents):
        trial, first = str(t + 1), 4 + 3 * t
        s.read(7, first, "binder-content", pb / 100, {"trial": trial}, unit="fraction", fmt="0.0%").merge(7, first, 3)
        gmms = [mix.gmm(pb), mix.gmm(pb)]
        rows = []
        for n in (0, 1):
            c, at = first + n, {"trial": trial, "specimen": "AB"[n]}
            dry, water, ssd, gmb = mix.masses(pb, mass=4690)
            s.read(8, c, "mass-in-air", dry, at).read(9, c, "mass-in-water", water, at).read(10, c, "mass-saturated-surface-dry", ssd, at)
            s.read(11, c, "bulk-specific-gravity-mix", rounded(gmb, 4), at, fmt="0.000")
            s.read(12, c, "maximum-specific-gravity", gmms[n], at, fmt="0.000")
            v = mix.volumetrics(pb, gmb, mean(gmms))
            rows.append((gmb, v["va"], v["vma"], v["vfa"]))
            s.read(13, c, "air-voids", rounded(v["va"] / 100, 4), at, unit="fraction", fmt="0.0%")
            s.read(14, c, "voids-in-mineral-aggregate", rounded(v["vma"] / 100, 4), at, unit="fraction", fmt="0.0%")
            s.read(15, c, "voids-filled-with-asphalt", rounded(v["vfa"] / 100, 4), at, unit="fraction", fmt="0.0%")
            s.read(16, c, "specimen-absorption", rounded((ssd - dry) / (ssd - water), 4), at, unit="fraction", fmt="0.00%")
        c = first + 2
        s.put(11, c, mean([x[0] for x in rows]), fmt="0.000").put(12, c, mean(gmms), fmt="0.000")
        for r, k in [(13, 1), (14, 2), (15, 3)]:
            s.put(r, c, mean([x[k] for x in rows]) / 100, fmt="0.0%")
    s.put(18, 2, "Dust/Pbe at optimum").read(18, 4, "dust-proportion", 1.07, {}, fmt="0.00")
    s.put(19, 2, "Draindown").put(19, 3, "%").put(19, 4, 0, formula="=0/0").doubt(19, 4, "error value")
    o = book.sheet("Old", hidden=True)
    o.put(1, 1, "Leftover from TA-12.5-K9 (2023)").row(2, 1, ["x", "y", "z"]).row(3, 1, [1, 2, 3])
    book.note("Rice determinations A and B stand beside specimens A and B; they are two determinations, as the specimens are.")
    return book, lambda path: with_office(book, path)


BOOKS = {"01-agency-verification": verification, "02-gradation-book": gradation_book, "03-side-by-side": side_by_side}
