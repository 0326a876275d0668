"""A one-page form, a performance report and a bench book with a sheet for each binder content."""


from files import UNITS, with_office, with_xlsxwriter
from lab import Book
from mixes import Mix, mean, rounded


def one_page():
    book = Book(UNITS)
    mix = Mix(1516, 5.7, 2.634, absorption=0.7, gb=1.030, dust=5.8)
    s = book.sheet("Form 26")
    s.put(1, 2, "KESTREL DALE SURFACING", bold=True).merge(1, 2, 4).put(1, 9, "Mix design form 26 rev. 4")
    s.row(3, 2, ["Mix No.", "NMAS, mm", "Traffic, MESAL", "Course", "Ndesign", "Binder grade", "Optimum AC", "Gsb", "Gb"], italic=True)
    s.put(4, 2, "KD-9.5-L1").put(4, 3, 9.5).put(4, 4, 3.0, fmt="0.0").put(4, 5, "Surface")
    for name, value in [("nominalMaximumSize", 9.5), ("designTraffic", 3.0), ("course", "surface"), ("binderGrade", "PG 64E-22")]:
        book.know(name, value)
    s.read(4, 6, "gyrations-design", 65, {}).put(4, 7, "PG 64E-22")
    s.read(4, 8, "binder-content", 5.7, {"trial": "design"}, fmt='0.0" %"', comment="interpolated at 4.0 % voids")
    s.read(4, 9, "bulk-specific-gravity-aggregate", 2.634, {}, fmt="0.000")
    s.read(4, 10, "binder-specific-gravity", 1.030, {}, fmt="0.000")
    s.row(6, 2, ["Date sampled", "Date received"], italic=True).put(7, 2, "03/04/2026").put(7, 3, "12 Mar 2026")
    s.put(9, 2, "GRADATION", bold=True).put(9, 6, "VOLUMETRICS", bold=True)
    s.row(10, 2, ["Sieve", "JMF, % pass.", "Tol. ±"])
    names = [("75 µm", 0.075), ("150 µm", 0.15), ("300 µm", 0.3), ("600 µm", 0.6), ("1.18 mm", 1.18), ("2.36 mm", 2.36),
             ("4.75 mm", 4.75), ("9.5 mm", 9.5), ("12.5 mm", 12.5)]
    passing = [5.8, 9, 15, 23, 33, 47, 69, 96, 100]
    for r, ((name, sieve), value) in enumerate(zip(names, passing), 11):
        s.put(r, 2, name).read(r, 3, "percent-passing", value, {"trial": "design", "sieve": sieve}).put(r, 4, [1.5, 2, 3, 4, 4, 4, 5, 5, 0][r - 11])
    s.row(10, 6, ["Trial pt.", "AC", "Gmb", "Gmm", "Va", "VMA", "VFA", "DP"]).row(11, 7, ["%", None, None, "%", "%", "%"])
    for r, (name, pb) in enumerate(zip("ABCD", [5.2, 5.7, 6.2, 6.7]), 12):
        gmm = mix.gmm(pb)
        gmb = rounded(mix.gmb(pb), 3)
        v = mix.volumetrics(pb, gmb, gmm)
        at = {"trial": name}
        s.put(r, 6, name).read(r, 7, "binder-content", pb, at, fmt="0.0")
        s.read(r, 8, "bulk-specific-gravity-mix", gmb, at, text=f"{gmb:.3f}*" if name == "B" else f"{gmb:.3f}")
        s.read(r, 9, "maximum-specific-gravity", gmm, at, text=f"\u00a0{gmm:.3f}")
        s.read(r, 10, "air-voids", rounded(v["va"], 1), at, fmt="0.0")
        s.read(r, 11, "voids-in-mineral-aggregate", rounded(v["vma"], 1), at, fmt="0.0")
        s.read(r, 12, "voids-filled-with-asphalt", rounded(v["vfa"], 0), at, fmt="0")
        s.read(r, 13, "dust-proportion", rounded(v["dp"], 2), at, fmt="0.00")
    s.put(16, 6, "Limits").row(16, 10, ["4.0", "15 min", "73-76", "0.6-1.2"])
    s.put(18, 6, "* one of three specimens discarded (tear)", italic=True)
    s.put(20, 6, "Moisture (T 283)", bold=True).row(21, 6, ["Dry str., kPa", "Wet str., kPa", "TSR"])
    for r, (dry, wet) in enumerate([(812, 731), (796, 702), (840, 719)], 22):
        s.read(r, 6, "tensile-strength-dry", dry, {"specimen": str(r - 21)}, optional=True)
        s.maybe(r, 7, "tensile-strength-conditioned", wet, {"specimen": str(r - 21)})
    s.read(22, 8, "tensile-strength-ratio", 0.88, {}, unit="fraction", fmt="0%").merge(22, 8, 1, 3)
    book.note("The strengths have no specimen numbers; any naming that keeps them apart is right, so they are optional.")
    book.note("Date sampled 03/04/2026 is ambiguous.")
    return book, lambda path: with_xlsxwriter(book, path)


def performance():
    book = Book(UNITS)
    mix = Mix(1517, 5.5, 2.66)
    s = book.sheet("I-FIT")
    s.put(1, 1, "Semi-circular bend, T 393, 25 °C, long-term aged", bold=True)
    s.row(3, 1, ["ID", "Thickness, mm", "Air voids", "Peak load", "Fracture energy", "Post-peak slope", "Flexibility"])
    s.row(4, 2, ["mm", "%", "kN", "J/m2", "kN/mm", "Index"])
    for r, name in enumerate(["1L", "1R", "2L", "2R"], 5):
        gf, slope = round(1480 + mix.noise(110)), rounded(-2.4 + mix.noise(0.2), 2)
        at, may = {"specimen": name}, {"temperature": 25, "aging": "long-term"}
        s.put(r, 1, name).read(r, 2, "specimen-thickness", rounded(50 + mix.noise(0.4), 1), at, fmt="0.0")
        s.read(r, 3, "air-voids", rounded(7 + mix.noise(0.2), 1), at, fmt="0.0")
        s.read(r, 4, "failure-load", rounded(3.1 + mix.noise(0.15), 2), at, fmt="0.00", may=may)
        s.read(r, 5, "fracture-energy", gf, at, may=may).read(r, 6, "post-peak-slope", slope, at, fmt="0.00", may=may)
        s.read(r, 7, "flexibility-index", rounded(0.01 * gf / -slope, 1), at, fmt="0.0", may=may)
    s.put(9, 1, "Avg.").put(9, 7, 0, formula="=AVERAGE(G5:G8)", fmt="0.0").put(10, 1, "CoV").put(10, 7, 0, formula="=STDEV(G5:G8)/G9", fmt="0%")
    h = book.sheet("Hamburg raw")
    h.put(1, 1, "Wheel tracking in water, 50 °C")
    h.row(3, 1, ["Wheel", "Pass", "Depth, in."])
    row = 4
    for wheel in ("L", "R"):
        for passes in (500, 1000, 2000, 5000, 10000, 15000, 20000):
            depth = rounded(0.022 * (passes / 1000) ** 0.62 * (1.1 if wheel == "R" else 1) + 0.004, 3)
            h.put(row, 1, wheel).put(row, 2, passes)
            h.read(row, 3, "wheel-track-rut-depth", depth, {"specimen": wheel, "passes": passes, "temperature": 50}, unit="in", fmt="0.000")
            row += 1
    f = book.sheet("Other")
    f.put(1, 1, "Other tests on the design mix", bold=True)
    f.put(3, 1, "Flow number (cycles), 54 °C").read(3, 2, "flow-number", 412, {"temperature": 54})
    f.put(4, 1, "Cantabro abrasion loss (%)").read(4, 2, "mass-loss-abrasion-mix", 6.8, {})
    f.put(5, 1, "Draindown (%)").read(5, 2, "draindown", 0.04, {})
    f.put(6, 1, "Ignition oven correction factor (%)").read(6, 2, "ignition-correction-factor", 0.21, {})
    f.put(7, 1, "Mix moisture (%)").read(7, 2, "mix-moisture", 0.05, {})
    f.put(8, 1, "RAP content (% by mass of mix)").read(8, 2, "rap-content", 20, {})
    f.put(9, 1, "RAP binder content (%)").read(9, 2, "rap-binder-content", 4.7, {})
    f.put(10, 1, "Recycled binder ratio").read(10, 2, "recycled-binder-ratio", 0.17, {})
    f.put(11, 1, "Overlay test").put(11, 2, "not done")
    return book, lambda path: with_office(book, path)


def bench_book():
    book = Book(UNITS)
    mix = Mix(1518, 5.3, 2.655, absorption=0.5, gb=1.027, mass=4700)
    cover = book.sheet("Cover")
    cover.put(3, 2, "Laboratory notebook BW-L2").put(4, 2, "Design started").put(4, 3, "2026-01-19").put(5, 2, "Technician").put(5, 3, "RA")
    for pb in (4.8, 5.3, 5.8):
        trial = str(pb)
        s = book.sheet(f"AC {pb}")
        s.maybe(1, 1, "binder-content", pb, {"trial": trial}, text=f"Bulk specific gravity - {pb}% AC", bold=True)
        s.put(3, 1, "Specimen").row(3, 3, [1, 2, 3, "Avg"])
        labels = [("Mass in air", "g"), ("Mass SSD", "g"), ("Mass in water", "g"), ("Bulk sp. gravity", None), ("Water absorbed", "% vol"), ("Height at Ndes", "mm")]
        for r, (label, unit) in enumerate(labels, 4):
            s.put(r, 1, label).put(r, 2, unit)
        gmbs = []
        for n in (1, 2, 3):
            dry, water, ssd, gmb = mix.masses(pb, mass=4700)
            gmbs.append(gmb)
            c, at, letter = 2 + n, {"trial": trial, "specimen": str(n)}, "CDE"[n - 1]
            s.read(4, c, "mass-in-air", dry, at).read(5, c, "mass-saturated-surface-dry", ssd, at).read(6, c, "mass-in-water", water, at)
            s.read(7, c, "bulk-specific-gravity-mix", gmb, at, fmt="0.000", formula=f"={letter}4/({letter}5-{letter}6)")
            s.read(8, c, "specimen-absorption", 100 * (ssd - dry) / (ssd - water), at, fmt="0.00",
                   formula=f"=100*({letter}5-{letter}4)/({letter}5-{letter}6)")
            s.read(9, c, "specimen-height", rounded((ssd - water) / 17.671 + mix.noise(0.2), 1), {**at, "gyrations": "design"}, fmt="0.0")
        s.put(7, 6, mean(gmbs), fmt="0.000", formula="=AVERAGE(C7:E7)")
        s.put(12, 1, "Rice test", bold=True).put(13, 1, "Flask").row(13, 3, ["A", "B", "Avg"])
        for r, label in enumerate(["Sample in air", "Flask + water", "Flask + water + sample", "Gmm"], 14):
            s.put(r, 1, label).put(r, 2, "g" if r < 17 else None)
        for k, flask in enumerate("AB"):
            a, d, e, gmm = mix.rice(pb, flask=7388.2 if k else 7402.5)
            letter = "CD"[k]
            s.down(14, 3 + k, [a, d, e])
            s.read(17, 3 + k, "maximum-specific-gravity", gmm, {"trial": trial, "specimen": flask}, fmt="0.000",
                   formula=f"={letter}14/({letter}14+{letter}15-{letter}16)")
        s.put(17, 5, 0, fmt="0.000", formula="=AVERAGE(C17:D17)")
        s.put(19, 1, "Air voids").put(19, 2, "%").read(19, 3, "air-voids", 0.0, {"trial": trial}, fmt="0.0", formula="=100*(1-F7/E17)")
        gmm_mean = mean([r["value"] for r in book.readings if r["quantity"] == "maximum-specific-gravity" and r["at"]["trial"] == trial])
        va = 100 * (1 - mean(gmbs) / gmm_mean)
        book.readings[-1]["value"] = book.readings[-1]["written"] = va
        s.put(20, 1, "Checked: OK", italic=True)
    return book, lambda path: with_office(book, path)


BOOKS = {"16-one-page-form": one_page, "17-performance-tests": performance, "18-bench-book": bench_book}
