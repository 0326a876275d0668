"""Low-temperature laboratories, an airfield's Marshall design, and a file whose formulas were never computed."""

from files import UNITS, with_office, with_openpyxl, with_text
from lab import PSI, Book
from mixes import Mix, mean, rounded

TIMES = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000]


def compliance(time, temperature):
    """A viscoelastic solid in 1/GPa; ten degrees are about a decade and a half of time."""
    reduced = time * 10 ** (1.5 * (temperature + 20) / 10)
    return 0.045 + (12 - 0.045) / (1 + (reduced / 3e6) ** -0.42)


def creep_list():
    book = Book(UNITS, flat=True)
    mix = Mix(1407, 5.4, 2.66)
    s = book.sheet("")
    s.put(1, 1, "Creep compliance export").put(2, 1, "Mix").put(2, 2, "KD-9.5-L1").put(3, 1, "Method").put(3, 2, "AASHTO T 322")
    s.row(5, 1, ["Temperature [°C]", "Specimen", "Loading time [s]", "D(t) [1/GPa]"])
    row = 6
    for temperature in (-20, -10, 0):
        for specimen in ("S1", "S2", "S3"):
            factor = 1 + mix.noise(0.04)
            for time in TIMES:
                value = rounded(compliance(time, temperature) * factor * (1 + mix.noise(0.004)), 4)
                s.put(row, 1, temperature).put(row, 2, specimen).put(row, 3, time)
                s.read(row, 4, "creep-compliance", value,
                       {"temperature": temperature, "specimen": specimen, "time": time}, fmt="%.4f")
                row += 1
    return book, lambda path: with_text(s, path, delimiter="\t", encoding="utf-16")


creep_list.extension = ".tsv"


def creep_sheets():
    book = Book(UNITS)
    mix = Mix(1408, 5.2, 2.66)
    for name, celsius, strength, nu in [("-4F", -20, 545, 0.22), ("14F", -10, 480, 0.28), ("32F", 0, 410, 0.33)]:
        fahrenheit = round(celsius * 1.8 + 32)
        s = book.sheet(name)
        s.put(1, 1, "INDIRECT TENSION CREEP TEST (T 322)", bold=True).merge(1, 1, 6)
        s.put(2, 1, "Mix:").put(2, 2, "TA-19.0-B2").put(3, 1, "Test temperature:").put(3, 2, f"{fahrenheit} °F")
        s.put(5, 1, "Time").put(5, 2, "Creep Compliance (1/psi)").merge(5, 2, 4)
        s.put(6, 1, "(s)").row(6, 2, ["Spec. A", "Spec. B", "Spec. C", "Avg."])
        for r, time in enumerate(TIMES, 7):
            s.put(r, 1, time)
            values = []
            for c, specimen in enumerate("ABC"):
                d = compliance(time, celsius) * (0.93 + 0.06 * c) * (1 + mix.noise(0.004))
                value = float(f"{d * PSI / 1e6:.3e}")
                values.append(value)
                s.read(r, 2 + c, "creep-compliance", value,
                       {"temperature": float(celsius), "specimen": specimen, "time": time}, unit="1/psi", fmt="0.00E+00")
            s.put(r, 5, mean(values), fmt="0.00E+00", formula=f"=AVERAGE(B{r}:D{r})", italic=True)
        s.put(18, 1, "Poisson's ratio").read(18, 2, "poissons-ratio", nu, {"temperature": float(celsius)}, fmt="0.00")
        s.put(20, 1, "Tensile strength, psi", bold=True)
        for c, specimen in enumerate("ABC"):
            s.read(20, 2 + c, "low-temperature-tensile-strength", round(strength + mix.noise(12)),
                   {"temperature": float(celsius), "specimen": specimen}, unit="psi")
        s.put(20, 5, 0, fmt="0", formula="=AVERAGE(B20:D20)", italic=True)
    return book, lambda path: with_office(book, path)


def airfield():
    book = Book(UNITS)
    mix = Mix(1409, 5.6, 2.641, absorption=0.45, gb=1.029, target=3.6, slope=1.7, mass=1195)
    s = book.sheet("Marshall")
    s.put(1, 1, "KESTREL DALE SURFACING", bold=True).put(2, 1, "Marshall Mix Design Worksheet - Airfield 3/4\" max., 75 blows")
    heads = ["% AC by\nwt. of mix", "Spec.\nNo.", "Wt. in Air\n(g)", "Wt. in Water\n(g)", "SSD Wt.\n(g)", "Bulk Volume\n(cc)",
             "Bulk Sp. Gr.", "Max. Sp. Gr.", "Unit Weight\n(pcf)", "% Air Voids", "% VMA", "% VFA", "Measured", "Corr. ratio",
             "Adjusted", "Flow\n(0.01 in.)"]
    s.row(5, 1, heads, wrap=True)
    s.put(4, 13, "Stability (lbf)", bold=True).merge(4, 13, 3)
    row = 6
    for pb in [4.6, 5.1, 5.6, 6.1, 6.6]:
        trial = str(pb)
        gmm = mix.gmm(pb)
        first = row
        for n in "abc":
            dry, water, ssd, _ = mix.masses(pb, voids=mix.true_voids(pb), mass=1195)
            at = {"trial": trial, "specimen": n}
            volume = rounded(ssd - water, 1)
            gmb = dry / (ssd - water)
            measured = round((2450 - 260 * (pb - 5.5) ** 2 + mix.noise(70)) / 10) * 10
            ratio = 1.04 if volume < 508.5 else 1.0
            va = 100 * (1 - gmb / gmm)
            vma = 100 - gmb * (100 - pb) / 2.641
            s.read(row, 1, "binder-content", pb, {"trial": trial}, fmt="0.0", may={"specimen": n}).put(row, 2, n)
            s.read(row, 3, "mass-in-air", dry, at, fmt="0.0").read(row, 4, "mass-in-water", water, at, fmt="0.0")
            s.read(row, 5, "mass-saturated-surface-dry", ssd, at, fmt="0.0")
            s.put(row, 6, volume, fmt="0.0", formula=f"=E{row}-D{row}")
            s.read(row, 7, "bulk-specific-gravity-mix", gmb, at, fmt="0.000", formula=f"=C{row}/F{row}")
            if n == "a":
                s.read(row, 8, "maximum-specific-gravity", gmm, {"trial": trial}, fmt="0.000")
            s.read(row, 9, "bulk-density-mix", gmb * 62.4, at, unit="lb/ft³", fmt="0.0", formula=f"=G{row}*62.4")
            s.read(row, 10, "air-voids", va, at, fmt="0.0", formula=f"=100*(1-G{row}/H${first})")
            s.read(row, 11, "voids-in-mineral-aggregate", vma, at, fmt="0.0", formula=f"=100-G{row}*(100-A{row})/$C$30")
            s.read(row, 12, "voids-filled-with-asphalt", 100 * (vma - va) / vma, at, fmt="0.0",
                   formula=f"=100*(K{row}-J{row})/K{row}")
            s.put(row, 13, measured, fmt="#,##0").put(row, 14, ratio, fmt="0.00")
            s.read(row, 15, "marshall-stability", measured * ratio, at, unit="lbf", fmt="#,##0", formula=f"=M{row}*N{row}")
            s.read(row, 16, "marshall-flow", round(11 + 1.6 * (pb - 5.1) + mix.noise(0.6)), at, unit="0.01 in")
            row += 1
        s.put(row, 2, "Avg.", bold=True)
        for c, letter, fmt in [(7, "G", "0.000"), (9, "I", "0.0"), (10, "J", "0.0"), (11, "K", "0.0"), (12, "L", "0.0"),
                               (15, "O", "#,##0"), (16, "P", "0.0")]:
            s.put(row, c, 0, fmt=fmt, bold=True, formula=f"=AVERAGE({letter}{first}:{letter}{row - 1})")
        row += 1
    s.put(30, 1, "Gsb =").read(30, 3, "bulk-specific-gravity-aggregate", 2.641, {}, fmt="0.000")
    s.put(31, 1, "Gb =").read(31, 3, "binder-specific-gravity", 1.029, {}, fmt="0.000")
    s.put(32, 1, "Criteria: stability 2150 lbf min.; flow 10 - 16; air voids 3.5 %", italic=True)
    book.note("Stability as measured precedes the correction for thickness; the adjusted one is the result.")
    return book, lambda path: with_office(book, path)


def uncomputed():
    book = Book(UNITS)
    mix = Mix(1410, 5.0, 2.688, absorption=0.5)
    s = book.sheet("Volumetrics")
    s.put(1, 1, "Volumetric work sheet").put(2, 1, "Gmm at design binder content")
    s.row(4, 1, ["Trial", "Specimen", "AC (%)", "Mass in air (g)", "Mass in water (g)", "SSD mass (g)", "Gmb", "Gmm", "Va (%)"])
    row = 5
    for t, pb in zip("ABCD", [4.5, 5.0, 5.5, 6.0]):
        gmm = mix.gmm(pb)
        for n in (1, 2, 3):
            dry, water, ssd, _ = mix.masses(pb)
            at = {"trial": t, "specimen": str(n)}
            s.put(row, 1, t).put(row, 2, n).read(row, 3, "binder-content", pb, {"trial": t}, fmt="0.0", may={"specimen": str(n)})
            s.read(row, 4, "mass-in-air", dry, at).read(row, 5, "mass-in-water", water, at)
            s.read(row, 6, "mass-saturated-surface-dry", ssd, at)
            s.put(row, 7, 0, formula=f"=D{row}/(F{row}-E{row})", fmt="0.000").doubt(row, 7, "formula without a result")
            s.read(row, 8, "maximum-specific-gravity", gmm, {"trial": t}, fmt="0.000", may={"specimen": str(n)})
            s.put(row, 9, 0, formula=f"=100*(H{row}-G{row})/H{row}", fmt="0.0").doubt(row, 9, "formula without a result")
            row += 1
    return book, lambda path: with_openpyxl(book, path)


BOOKS = {
    "07-creep-export": creep_list,
    "08-low-temperature": creep_sheets,
    "09-airfield-marshall": airfield,
    "10-never-computed": uncomputed,
}
