"""Binder report, production with sublots across, a cover of certificates, Marshall in pounds, and a whole submittal."""

import datetime

from files import UNITS, with_openpyxl, with_text, with_xlsxwriter
from lab import Book
from mixes import Mix, mean, rounded


def binder():
    """Labels and values two cells apart; the unit is in the value, sections for each aging."""
    book = Book(UNITS)
    s = book.sheet("Report of Analysis")
    s.put(1, 2, "REPORT OF ANALYSIS", bold=True).put(2, 2, "Terminal 4, tank 12").put(3, 2, "Reported").put(3, 5, "11-Mar-2026")
    s.put(4, 2, "Grade").put(4, 5, "PG 76-22")
    book.know("binderGrade", "PG 76-22")
    lines = [
        ("TESTS ON ORIGINAL BINDER", None, None, None, None, {}, {}),
        ("Specific gravity at 60 °F", "1.036", 1.036, "binder-specific-gravity", "1", {}, {"temperature": (60 - 32) / 1.8}),
        ("Flash point, COC", "586 °F", 586, "flash-point", "°F", {}, {}),
        ("Viscosity at 135 °C", "1875 cP", 1875, "rotational-viscosity", "cP", {"temperature": 135}, {}),
        ("Dynamic shear G*/sin d at 76 °C", "1.22 kPa", 1.22, "rutting-parameter", "kPa", {"temperature": 76}, {"aging": "original"}),
        ("Phase angle at 76 °C", "71.4 deg", 71.4, "binder-phase-angle", "°", {"temperature": 76}, {"aging": "original"}),
        ("Penetration at 25 °C", "48 dmm", 48, "penetration", "dmm", {"temperature": 25}, {}),
        ("Softening point", "149 °F", 149, "softening-point", "°F", {}, {}),
        ("TESTS ON RTFO RESIDUE", None, None, None, None, {}, {}),
        ("Mass loss", "0.31 %", 0.31, None, "%", {}, {}),
        ("MSCR Jnr at 3.2 kPa, 76 °C", "0.41 1/kPa", 0.41, "non-recoverable-compliance", "1/kPa", {"temperature": 76, "stress": 3.2}, {"aging": "RTFO"}),
        ("MSCR recovery at 3.2 kPa, 76 °C", "62.3 %", 62.3, "percent-recovery", "%", {"temperature": 76, "stress": 3.2}, {"aging": "RTFO"}),
        ("Elastic recovery at 25 °C", "78 %", 78, "elastic-recovery", "%", {}, {"aging": "RTFO", "temperature": 25}),
        ("TESTS ON PAV RESIDUE (100 °C)", None, None, None, None, {}, {}),
        ("G* sin d at 31 °C", "2890 kPa", 2890, "fatigue-parameter", "kPa", {"temperature": 31}, {"aging": "PAV"}),
        ("BBR stiffness at -12 °C", "171 MPa", 171, "creep-stiffness", "MPa", {"temperature": -12}, {"aging": "PAV"}),
        ("BBR m-value at -12 °C", "0.322", 0.322, "creep-rate", "1", {"temperature": -12}, {"aging": "PAV"}),
        ("Delta Tc", "−3.1 °C", -3.1, "critical-temperature-difference", "°C", {}, {"aging": "PAV"}),
    ]
    for r, (label, text, value, quantity, unit, at, may) in enumerate(lines, 6):
        s.put(r, 2, label, bold=text is None)
        if quantity:
            s.read(r, 5, quantity, value, at, unit=unit, text=text, may=may or None)
        elif text:
            s.put(r, 5, text)
    s.put(25, 2, "Lab mixing temp.").read(25, 5, "mixing-temperature", 325, {}, unit="°F", text="320 - 330 °F", optional=True)
    book.document("binder-certificate", "2026-03-11", None)
    book.note("A mass loss of 0.31 % is a mass change of -0.31 %: reading it as +0.31 is wrong, leaving it is right.")
    book.note("The mixing temperature is a range.")
    book.optional.pop()
    return book, lambda path: with_openpyxl(book, path)


def production():
    """Sublots across in pairs of daily columns, densities in pounds a cubic foot, cores below."""
    book = Book(UNITS)
    mix = Mix(2415, 5.2, 2.655, absorption=0.5, dust=5.3)
    s = book.sheet("Lot 3")
    s.put(1, 1, "LOT 3 QUALITY CONTROL SUMMARY", bold=True).put(3, 1, "Sublot").put(4, 1, "Date").put(3, 8, "Lot avg.").put(3, 9, "Target").put(3, 10, "Limits")
    labels = [("Pb (%)", "binder-content", "0.00", "%"), ("Gmm", "maximum-specific-gravity", "0.000", "1"), ("Lab. compacted density (pcf)", "bulk-density-mix", "0.0", "lb/ft³"),
              ("Air voids (%)", "air-voids", "0.0", "%"), ("Passing 1/2\" (%)", 12.5, "0", "%"), ("Passing #8 (%)", 2.36, "0", "%"), ("Passing #200 (%)", 0.075, "0.0", "%"),
              ("Moisture (%)", "mix-moisture", "0.00", "%")]
    for r, (label, *_rest) in enumerate(labels, 5):
        s.put(r, 1, label)
    table = []
    for c in range(2, 7):
        pb = rounded(5.2 + mix.noise(0.1), 2)
        gmm = mix.gmm(pb)
        density = rounded(mix.gmb(pb, voids=3.9, sd=0.008) * 62.24, 1)
        values = [pb, gmm, density, rounded(100 * (1 - density / 62.24 / gmm), 1), round(96 + mix.noise(1)), round(42 + mix.noise(2)),
                  rounded(5.3 + mix.noise(0.25), 1), rounded(0.06 + abs(mix.noise(0.02)), 2)]
        table.append(values)
        at = {"specimen": f"3-{c - 1}"}
        s.put(3, c, at["specimen"]).put(4, c, datetime.date(2026, 5, 3 + c), fmt="m/d/yyyy")
        for r, (value, (_label, quantity, fmt, unit)) in enumerate(zip(values, labels), 5):
            if isinstance(quantity, float):
                s.read(r, c, "percent-passing", value, {**at, "sieve": quantity}, fmt=fmt)
            else:
                s.read(r, c, quantity, value, at, unit=unit, fmt=fmt)
    for r, limits in enumerate([(5.2, "±0.3"), (2.489, "±0.020"), (None, None), (4.0, "±1.0"), (96, "±6"), (42, "±5"), (5.3, "±1.5"), (None, "0.30 max")], 5):
        s.put(r, 8, mean([t[r - 5] for t in table]), fmt="0.00").put(r, 9, limits[0]).put(r, 10, limits[1])
    s.put(15, 1, "ROADWAY CORES", bold=True).row(16, 1, ["Core", "Lane", "Density (pcf)", "% of Gmm", "Voids (%)", "Thick. (in.)"])
    for n in range(1, 11):
        density = rounded(2.489 * 62.24 * (0.938 + mix.noise(0.008)), 1)
        share = rounded(100 * density / 62.24 / 2.489, 1)
        at = {"specimen": f"3-{(n + 1) // 2}{'AB'[(n + 1) % 2]}"}
        s.put(16 + n, 1, at["specimen"]).put(16 + n, 2, "EB" if n % 2 else "WB")
        s.maybe(16 + n, 3, "bulk-density-mix", density, at, unit="lb/ft³", fmt="0.0").read(16 + n, 4, "field-density", share, at, fmt="0.0", may={"variant": "maximum"})
        s.read(16 + n, 5, "in-place-air-voids", rounded(100 - share, 1), at, fmt="0.0")
        s.maybe(16 + n, 6, "lift-thickness", rounded(2.1 + mix.noise(0.12), 2), at, unit="in", fmt="0.00")
    s.put(27, 1, "Average").put(27, 4, 93.8).put(28, 1, "Minimum").put(28, 4, 92.0)
    book.note("Targets of the job mix stand beside the sublots and are not restated as readings; taking them at the design is not wrong.")
    for r, quantity, value, at in [(5, "binder-content", 5.2, {}), (6, "maximum-specific-gravity", 2.489, {}), (8, "air-voids", 4.0, {}),
                                   (9, "percent-passing", 96, {"sieve": 12.5}), (10, "percent-passing", 42, {"sieve": 2.36}), (11, "percent-passing", 5.3, {"sieve": 0.075})]:
        s.maybe(r, 9, quantity, value, {"trial": "design", **at})
    return book, lambda path: with_xlsxwriter(book, path)


def certificates():
    """A cover of the submittal's papers: ISO, words, real and ambiguous dates; project facts in a block with values below."""
    book = Book(UNITS)
    s = book.sheet("Transmittal")
    s.put(2, 3, "SUBMITTAL TRANSMITTAL", bold=True).merge(2, 3, 3).put(3, 3, "Kestrel Dale Surfacing to Carrow Valley Roads Authority")
    s.row(5, 2, ["Mix type", "Nominal max. size", "Course", "Design ESALs (millions)", "Binder", "Compaction"], bold=True)
    s.row(6, 2, ["Dense-graded", "19 mm", "Intermediate", 7.5, "PG 70-22", "Gyratory"])
    for name, value in [("mixType", "dense-graded"), ("nominalMaximumSize", 19), ("course", "intermediate"), ("designTraffic", 7.5), ("binderGrade", "PG 70-22"),
                        ("compactionMethod", "gyratory")]:
        book.know(name, value)
    s.put(8, 2, "Design binder content").read(8, 5, "binder-content", 4.9, {"trial": "design"}).put(8, 6, "% by mass of mix")
    s.put(9, 2, "Ninitial").read(9, 5, "gyrations-initial", 7, {}).put(10, 2, "Ndesign").read(10, 5, "gyrations-design", 75, {})
    s.put(11, 2, "Nmaximum").read(11, 5, "gyrations-maximum", 115, {}).put(12, 2, "RAP, % of mix").read(12, 5, "rap-content", 15, {})
    s.put(13, 2, "Anti-strip, % of binder").read(13, 5, "anti-strip-content", 0.5, {})
    s.row(16, 2, ["Document", "Reference", "Date", "Expires", "Copies"], bold=True)
    papers = [
        ("Mix design report", "MD-26-19", "2026-02-27", None, "mix-design-report", "2026-02-27", None),
        ("Binder certificate of analysis", "CoA 5514", "4 Mar 2026", None, "binder-certificate", "2026-03-04", None),
        ("Laboratory accreditation certificate", "L-77", datetime.date(2025, 9, 1), datetime.date(2028, 8, 31), "laboratory-accreditation", "2025-09-01", "2028-08-31"),
        ("Safety data sheet, anti-strip", "SDS-9", "June 14, 2025", None, "safety-data-sheet", "2025-06-14", None),
        ("Aggregate source approval letter", "CV-Q-11", "03/04/2026", None, "aggregate-source-approval", None, None),
    ]
    for r, (name, number, issued, expires, kind, date, valid) in enumerate(papers, 17):
        s.put(r, 2, name).put(r, 3, number).put(r, 4, issued, fmt=None if isinstance(issued, str) else "d mmm yyyy").put(r, 5, expires, fmt="d mmm yyyy").put(r, 6, 1)
        if date:
            book.document(kind, date, valid)
    s.doubt(21, 4, "day and month of 03/04/2026 are not known")
    book.note("The source approval's date is ambiguous: the document may be recorded without a date.")
    return book, lambda path: with_xlsxwriter(book, path)


def pounds():
    """A text file of Marshall results as a program pastes it: one wide header, quarter-millimetre flow."""
    book = Book(UNITS, flat=True)
    mix = Mix(2417, 5.5, 2.63, absorption=0.5, gb=1.03, target=3.8, slope=1.7)
    s = book.sheet("")
    s.row(1, 1, ["Mix", "AC %", "Plug", "Bulk SG", "Max SG", "Voids %", "Stability lbs", "Flow 0.01 in", "Date"])
    row = 2
    for pb in (5.0, 5.5, 6.0, 6.5):
        gmm = mix.gmm(pb)
        for n in (1, 2, 3):
            at = {"trial": str(pb), "specimen": str(n)}
            gmb = rounded(mix.gmb(pb), 3)
            s.put(row, 1, "TA-AF-1").read(row, 2, "binder-content", pb, {"trial": str(pb)}, may={"specimen": str(n)}).put(row, 3, n)
            s.read(row, 4, "bulk-specific-gravity-mix", gmb, at, fmt="%.3f").read(row, 5, "maximum-specific-gravity", gmm, {"trial": str(pb)}, fmt="%.3f", may={"specimen": str(n)})
            s.read(row, 6, "air-voids", rounded(100 * (1 - gmb / gmm), 1), at).read(row, 7, "marshall-stability", round((2700 - 200 * (pb - 5.6) ** 2 + mix.noise(60)) / 5) * 5, at, unit="lbf")
            s.read(row, 8, "marshall-flow", round(10 + 1.7 * (pb - 5) + mix.noise(0.5)), at, unit="0.01 in").put(row, 9, "2026-02-10")
            row += 1
    return book, lambda path: with_text(s, path, delimiter="\t", encoding="utf-16-le" if False else "utf-16")


pounds.extension = ".tsv"

BOOKS = {"14-binder-report": binder, "15-production-across": production, "16-transmittal": certificates, "17-marshall-paste": pounds}
