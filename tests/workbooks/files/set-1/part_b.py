"""Laboratories that write German, French and Spanish."""

import datetime
import math

from files import UNITS, with_office, with_openpyxl, with_text
from lab import Book
from mixes import Mix, blend_of, mean, rounded


def marshall_text():
    """A text file as a German laboratory's program exports it: semicolons, decimal commas, Windows-1252."""
    book = Book(UNITS, flat=True)
    mix = Mix(1303, 6.2, 2.668, absorption=0.3, gb=1.022, target=3.0, slope=1.9, dust=8.4, mass=1210)
    s = book.sheet("")
    s.put(1, 1, "Tollhouse Asphalt - Prüfstelle").put(2, 1, "Erstprüfung Asphaltbeton AC 8 D S")
    s.put(3, 1, "Datum").put(3, 2, "17.02.2026").put(4, 1, "Bindemittel").put(4, 2, "50/70")
    book.know("binderGrade", "50/70")
    s.put(5, 1, "Schläge je Seite").put(5, 2, 50)
    book.know("compactionBlows", 50)
    s.put(6, 1, "Dichte Bindemittel g/cm³").maybe(6, 2, "binder-specific-gravity", 1.022, {}, fmt="%.3f")
    s.put(7, 1, "Erweichungspunkt RuK °C").read(7, 2, "softening-point", 49.6, {}, fmt="%.1f")
    s.put(8, 1, "Nadelpenetration 25 °C 1/10 mm").read(8, 2, "penetration", 58, {"temperature": 25})
    s.row(10, 1, ["Variante", "Bindemittelgehalt", "Probekörper", "Höhe", "Masse trocken", "Masse unter Wasser",
                  "Masse SSD", "Raumdichte", "Rohdichte", "Hohlraumgehalt", "Stabilität", "Fließwert"])
    s.row(11, 2, ["M.-%", "Nr.", "mm", "g", "g", "g", "g/cm³", "g/cm³", "Vol.-%", "kN", "mm"])
    row = 12
    for v, pb in enumerate([5.8, 6.2, 6.6]):
        trial = "ABC"[v]
        rho = rounded(mix.true_gmm(pb) * 0.9971 + mix.noise(0.002), 3)
        rows = []
        for n in range(1, 5):
            dry, water, ssd, gmb = mix.masses(pb, voids=mix.true_voids(pb), mass=1210)
            density = rounded(gmb * 0.9971, 3)
            height = rounded((ssd - water) / 81.07 * 10, 1)
            stability = rounded(11.2 - 0.8 * (pb - 6.0) ** 2 + mix.noise(0.5), 1)
            flow = rounded(3.0 + 0.8 * (pb - 5.8) + mix.noise(0.2), 1)
            rows.append((density, 100 * (1 - density / rho), stability, flow))
            at = {"trial": trial, "specimen": f"{trial}{n}"}
            s.put(row, 1, trial).put(row, 3, at["specimen"])
            own = {"specimen": at["specimen"]}
            s.read(row, 2, "binder-content", pb, {"trial": trial}, fmt="%.1f", may=own)
            s.read(row, 4, "specimen-height", height, at, fmt="%.1f").read(row, 5, "mass-in-air", dry, at, fmt="%.1f")
            s.read(row, 6, "mass-in-water", water, at, fmt="%.1f")
            s.read(row, 7, "mass-saturated-surface-dry", ssd, at, fmt="%.1f")
            s.read(row, 8, "bulk-density-mix", density, at, unit="g/cm³", fmt="%.3f")
            s.read(row, 9, "maximum-density-mix", rho, {"trial": trial}, unit="g/cm³", fmt="%.3f", may=own)
            s.read(row, 10, "air-voids", rounded(rows[-1][1], 1), at, fmt="%.1f")
            s.read(row, 11, "marshall-stability", stability, at, fmt="%.1f")
            s.read(row, 12, "marshall-flow", flow, at, fmt="%.1f")
            row += 1
        s.put(row, 3, "Mittel")
        for c, k, fmt in [(8, 0, "%.3f"), (10, 1, "%.1f"), (11, 2, "%.1f"), (12, 3, "%.1f")]:
            s.put(row, c, mean([r[k] for r in rows]), fmt=fmt)
        row += 2
    s.put(row, 1, "Prüfung nach EN 12697-34 bei 60 °C").put(row + 1, 1, "Anforderung Hohlraumgehalt 2,0 bis 3,5 Vol.-%")
    book.note("Maximum density stands in the row of each specimen but belongs to the variant.")
    return book, lambda path: with_text(s, path, delimiter=";", encoding="cp1252", comma=True)


marshall_text.extension = ".csv"

PILES = [
    ("Füller", 6.0, [82.0, 94.0, 99.0, 100, 100, 100, 100, 100, 100, 100]),
    ("Brechsand 0/2", 34.0, [11.8, 19.5, 33.1, 53.4, 75.2, 94.6, 100, 100, 100, 100]),
    ("Splitt 2/5", 18.0, [1.1, 1.4, 1.6, 1.9, 2.6, 9.8, 92.5, 100, 100, 100]),
    ("Splitt 5/8", 20.0, [0.8, 0.9, 1.0, 1.1, 1.2, 1.6, 7.9, 93.4, 100, 100]),
    ("Splitt 8/11", 22.0, [0.6, 0.7, 0.7, 0.8, 0.9, 1.0, 1.4, 8.8, 94.1, 100]),
]
EN = [0.063, 0.125, 0.25, 0.5, 1, 2, 5.6, 8, 11.2, 16]


def german():
    book = Book(UNITS)
    mix = Mix(1304, 5.9, 2.745, absorption=0.35, gb=1.027, target=3.2, slope=1.9, mass=1235)
    d = book.sheet("Deckblatt")
    d.put(2, 2, "Eignungsnachweis / Erstprüfungsbericht", bold=True).merge(2, 2, 4)
    d.put(4, 2, "Auftraggeber:").put(4, 4, "Kestrel Dale Surfacing").put(5, 2, "Bericht Nr.:").put(5, 4, "EP 26-031")
    d.put(6, 2, "Datum der Prüfung:").put(6, 4, datetime.date(2026, 1, 28), fmt="DD.MM.YYYY")
    d.put(7, 2, "Mischgutart/-sorte:").put(7, 4, "AC 11 D S").put(8, 2, "Bindemittel:").put(8, 4, "25/55-55 A")
    book.know("binderGrade", "25/55-55 A")
    d.put(10, 2, "Kennwert").put(10, 3, "Einheit").put(10, 4, "Sollwert", bold=True).put(10, 5, "Anforderung", bold=True)
    design = {"trial": "design"}
    rows = [
        ("Bindemittelgehalt (B)", "M.-%", "binder-content", 5.9, "min. 5,8", "0.0"),
        ("Hohlraumgehalt MPK (V)", "Vol.-%", "air-voids", 3.2, "2,5 - 4,5", "0.0"),
        ("Hohlraumausfüllungsgrad (VFB)", "%", "voids-filled-with-asphalt", 80.9, "-", "0.0"),
        ("fiktiver Hohlraumgehalt (VMA)", "Vol.-%", "voids-in-mineral-aggregate", 16.8, "-", "0.0"),
        ("Bindemittel-Volumen", "Vol.-%", "effective-binder-volume", 13.6, "-", "0.0"),
        ("Spurrinnentiefe, proportional (PRD LUFT)", "%", "proportional-rut-depth", 4.1, "max. 5,0", "0.0"),
        ("Spaltzugfestigkeitsverhältnis ITSR", "%", "tensile-strength-ratio", 91, "min. 80", "0"),
    ]
    for r, (label, unit, quantity, value, limit, fmt) in enumerate(rows, 11):
        put = d.maybe if quantity == "effective-binder-volume" else d.read
        d.put(r, 2, label).put(r, 3, unit)
        put(r, 4, quantity, value, design, fmt=fmt)
        d.put(r, 5, limit)
    d.put(20, 2, "Prüfstellenleiter").put(21, 2, "(Unterschrift)", italic=True)
    german_gradation(book)
    german_variants(book, mix)
    german_itsr(book, mix)
    return book, lambda path: with_office(book, path)


def german_gradation(book):
    s = book.sheet("Sieblinie")
    s.put(1, 1, "Korngrößenverteilung der Lieferkörnungen und des Gesteinskörnungsgemisches", bold=True)
    s.put(3, 1, "Lieferkörnung").merge(3, 1, 1, 2).put(3, 2, "Anteil\nM.-%", wrap=True).merge(3, 2, 1, 2)
    s.put(3, 3, "Siebdurchgang in M.-% bei Siebweite in mm").merge(3, 3, 10)
    s.row(4, 3, EN)
    for r, (name, share, passing) in enumerate(PILES, 5):
        s.put(r, 1, name).read(r, 2, "stockpile-share", share, {"stockpile": name}, fmt="0.0")
        for c, (sieve, value) in enumerate(zip(EN, passing), 3):
            s.read(r, c, "percent-passing", value, {"stockpile": name, "sieve": sieve}, fmt="0.0")
    blend = blend_of([p[1] for p in PILES], [p[2] for p in PILES], EN)
    s.put(10, 1, "Summe").put(10, 2, 100.0, fmt="0.0", formula="=SUM(B5:B9)")
    s.put(11, 1, "Gemisch (Soll)", bold=True)
    for c, (sieve, value) in enumerate(zip(EN, blend), 3):
        s.read(11, c, "percent-passing", value, {"trial": "design", "sieve": sieve}, fmt="0.0", bold=True)
    s.put(12, 1, "Grenze unten").put(13, 1, "Grenze oben")
    s.row(12, 3, [5, None, None, None, None, 40, None, 70, 90, 100]).row(13, 3, [9, None, None, None, None, 55, None, 85, 100, 100])
    s.put(15, 1, "Siebung nach EN 933-1, Nasssiebung")


def german_variants(book, mix):
    s = book.sheet("Varianten")
    s.put(1, 1, "Marshall-Probekörper (2 x 50 Schläge, 145 °C)", bold=True)
    s.put(3, 1, "Kennwert").put(3, 2, "Einheit")
    for c, title in [(3, "Variante 1"), (6, "Variante 2"), (9, "Variante 3")]:
        s.put(3, c, title).merge(3, c, 3)
    s.put(4, 1, "Probekörper")
    labels = [("Bindemittelgehalt", "M.-%"), ("Trockenmasse", "g"), ("Masse unter Wasser", "g"), ("Masse feucht", "g"),
              ("Raumdichte", "Mg/m³"), ("Rohdichte des Mischgutes", "Mg/m³"), ("Hohlraumgehalt", "Vol.-%")]
    for r, (label, unit) in enumerate(labels, 5):
        s.put(r, 1, label).put(r, 2, unit)
    for v, pb in enumerate([5.6, 5.9, 6.2]):
        trial = str(v + 1)
        first = 3 + 3 * v
        rho = rounded(mix.true_gmm(pb) * 0.9971 + mix.noise(0.002), 3)
        s.read(5, first, "binder-content", pb, {"trial": trial}, fmt="0.0").merge(5, first, 3)
        s.read(10, first, "maximum-density-mix", rho, {"trial": trial}, unit="Mg/m³", fmt="0.000").merge(10, first, 3)
        for n in range(3):
            c, at = first + n, {"trial": trial, "specimen": f"{v + 1}.{n + 1}"}
            dry, water, ssd, gmb = mix.masses(pb, mass=1235)
            density = rounded(gmb * 0.9971, 3)
            s.put(4, c, at["specimen"]).read(6, c, "mass-in-air", dry, at).read(7, c, "mass-in-water", water, at)
            s.read(8, c, "mass-saturated-surface-dry", ssd, at)
            s.read(9, c, "bulk-density-mix", density, at, unit="Mg/m³", fmt="0.000")
            letter = "CDEFGHIJKL"[c - 3]
            base = "CDEFGHIJKL"[first - 3]
            s.read(11, c, "air-voids", 100 * (1 - density / rho), at, fmt="0.0", formula=f"=100*({base}10-{letter}9)/{base}10")


def german_itsr(book, mix):
    s = book.sheet("ITSR")
    s.put(1, 1, "Wasserempfindlichkeit nach EN 12697-12, Prüftemperatur 15 °C", bold=True)
    s.row(3, 1, ["Gruppe", "PK", "Höhe [mm]", "Durchmesser [mm]", "Höchstlast [kN]", "Spaltzugfestigkeit [N/mm²]"], wrap=True)
    row = 4
    for group, quantity, base in [("trocken", "tensile-strength-dry", 2.31), ("nass", "tensile-strength-conditioned", 2.10)]:
        s.put(row, 1, group).merge(row, 1, 1, 4)
        values = []
        for n in range(3):
            name = f"{group[0].upper()}{n + 1}"
            height, diameter = rounded(63.4 + mix.noise(0.5), 1), 101.6
            load = rounded((base + mix.noise(0.06)) * 3.14159265 * height * diameter / 2000, 2)
            value = rounded(2000 * load / (3.14159265 * height * diameter), 3)
            values.append(value)
            at, may = {"specimen": name}, {"temperature": 15}
            s.put(row, 2, name).read(row, 3, "specimen-height", height, at, fmt="0.0")
            s.read(row, 4, "specimen-diameter", diameter, at, fmt="0.0")
            s.read(row, 5, "failure-load", load, at, fmt="0.00", may=may)
            s.read(row, 6, quantity, value, at, unit="N/mm²", fmt="0.000", may=may)
            row += 1
        s.put(row, 2, "Mittelwert", italic=True).put(row, 6, rounded(mean(values), 3), fmt="0.000", italic=True)
        row += 1


FR = [20, 14, 10, 6.3, 4, 2, 1, 0.5, 0.25, 0.063]
FR_PILES = [
    ("0/2 concassé", 35, [100, 100, 100, 100, 100, 93, 66, 46, 31, 14.2]),
    ("2/6 concassé", 18, [100, 100, 100, 95, 52, 7, 3, 2.4, 2.0, 1.2]),
    ("6/10 concassé", 26, [100, 100, 91, 11, 3, 1.6, 1.3, 1.1, 0.9, 0.6]),
    ("10/14 concassé", 19, [100, 92, 14, 2.2, 1.4, 1.1, 1.0, 0.9, 0.8, 0.5]),
    ("Filler calcaire", 2, [100, 100, 100, 100, 100, 100, 100, 100, 98, 84]),
]


def french():
    book = Book(UNITS)
    mix = Mix(1305, 5.2, 2.742, absorption=0.4, gb=1.030)
    s = book.sheet("Étude")
    s.put(1, 2, "ÉTUDE DE FORMULATION - NIVEAU 2", bold=True).put(2, 2, "BBSG 0/14 classe 3 - liant 35/50")
    s.put(4, 2, "Dosage en liant (% de l'enrobé)").read(4, 5, "binder-content", 5.2, {}, text="5,2 %")
    s.put(5, 2, "Densité du bitume").read(5, 5, "binder-specific-gravity", 1.030, {}, fmt="0.000")
    s.put(6, 2, "MVRe").read(6, 5, "maximum-density-mix", rounded(mix.true_gmm(5.2) * 0.9971, 3), {}, unit="Mg/m³", fmt="0.000")
    s.put(6, 4, "Mg/m³").put(7, 2, "Température d'essai").put(7, 5, "60 °C")
    s.put(9, 2, "COMPOSITION GRANULOMÉTRIQUE", bold=True)
    s.put(10, 2, "Tamis (mm)").put(10, 3, "Passant (%)").merge(10, 3, 6)
    s.put(12, 2, "Dosage (%)")
    for c, (name, share, _passing) in enumerate(FR_PILES, 3):
        s.put(11, c, name, wrap=True).read(12, c, "stockpile-share", share, {"stockpile": name})
    s.put(11, 8, "Mélange").put(12, 8, 100)
    blend = blend_of([p[1] for p in FR_PILES], [p[2] for p in FR_PILES], FR)
    for r, sieve in enumerate(FR):
        row = 13 + r
        s.put(row, 2, sieve)
        for c, (name, _share, passing) in enumerate(FR_PILES, 3):
            s.read(row, c, "percent-passing", passing[r], {"stockpile": name, "sieve": sieve})
        s.read(row, 8, "percent-passing", blend[r], {"sieve": sieve}, fmt="0.0")
    s.put(23, 2, "Module de richesse").put(23, 3, 3.4)
    french_press(book, mix)
    french_water(book, mix)
    return book, lambda path: with_openpyxl(book, path)


def french_press(book, mix):
    s = book.sheet("PCG")
    s.put(1, 1, "Presse à cisaillement giratoire - NF EN 12697-31").put(3, 1, "Nombre de girations").put(3, 2, "% de vides").merge(3, 2, 4)
    s.row(4, 2, ["Ép. 1", "Ép. 2", "Ép. 3", "Moyenne"])
    offsets = [mix.noise(0.3) for _ in range(3)]
    for r, n in enumerate([5, 10, 20, 30, 40, 60, 80, 100, 120, 150, 200], 5):
        s.put(r, 1, n)
        values = [rounded(21.9 - 3.55 * math.log(n / 5) * 1.15 + 0.0 + offsets[k] + mix.noise(0.03), 1) for k in range(3)]
        for k, value in enumerate(values):
            s.read(r, 2 + k, "air-voids", value, {"specimen": str(k + 1), "gyrations": n}, fmt="0.0")
        s.put(r, 5, rounded(mean(values), 1), fmt="0.0")
    s.put(17, 1, "Spécification : 4 à 9 % à 80 girations", italic=True)


def french_water(book, mix):
    s = book.sheet("Tenue à l'eau")
    s.put(1, 1, "Sensibilité à l'eau NF EN 12697-12 méthode B (Duriez)").put(3, 1, "Éprouvette").put(3, 2, "Conservation")
    s.put(3, 3, "Hauteur\n(mm)", wrap=True).put(3, 4, "Charge\n(kN)", wrap=True)
    for r in range(8):
        wet = r % 2 == 1
        at = {"specimen": str(r + 1)}
        s.put(4 + r, 1, r + 1).put(4 + r, 2, "immergée" if wet else "à sec")
        s.read(4 + r, 3, "specimen-height", rounded(126.5 + mix.noise(1.2), 1), at, fmt="0.0")
        s.read(4 + r, 4, "failure-load", rounded((98 if wet else 112) + mix.noise(2), 1), at, fmt="0.0", optional=True)
    s.put(13, 1, "i/C (%)").maybe(13, 4, "tensile-strength-ratio", 88, {})
    s.put(14, 1, "ITSR mini").put(14, 4, 70)
    book.note("Duriez is a compression test: its loads and ratio are not the indirect tensile ones, so they are optional.")


def spanish():
    book = Book(UNITS)
    mix = Mix(1306, 4.7, 2.655, absorption=0.6, gb=1.032, target=4.5, slope=1.8, mass=1180)
    s = book.sheet("Fórmula")
    s.put(1, 1, "FÓRMULA DE TRABAJO", bold=True).put(2, 1, "Mezcla AC 22 bin S").put(3, 1, "Betún: 50/70")
    s.put(5, 1, "Tamiz UNE (mm)").put(5, 2, "% que pasa").put(5, 3, "Huso inferior").put(5, 4, "Huso superior").put(5, 5, "Tolerancia ±")
    rows = [(31.5, 100, 100, 100, 0), (22, 94, 90, 100, 4), (16, 79, 70, 88, 4), (8, 56, 50, 66, 4), (4, 43, None, None, 4),
            (2, 31, 24, 38, 3), (0.5, 16, 11, 21, 3), (0.25, 10, 7, 15, 2), (0.063, 5.2, 3, 7, 1)]
    for r, (sieve, value, low, high, tolerance) in enumerate(rows, 6):
        opening = 22.4 if sieve == 22 else sieve
        s.put(r, 1, sieve).read(r, 2, "percent-passing", value, {"trial": "design", "sieve": opening})
        s.put(r, 3, low).put(r, 4, high).put(r, 5, tolerance)
    s.put(17, 1, "Ligante óptimo s/mezcla").read(17, 2, "binder-content", 4.7, {"trial": "design"}).put(17, 3, "%")
    s.put(18, 1, "Ligante óptimo s/áridos").put(18, 2, 4.93).put(18, 3, "%")
    s.put(19, 1, "Temperatura de mezclado").read(19, 2, "mixing-temperature", 165, {}).put(19, 3, "°C")
    s.put(20, 1, "Temperatura de compactación").read(20, 2, "compaction-temperature", 150, {}).put(20, 3, "°C")
    book.note("The sieve called 22 in the trade is the 22.4 mm one.")
    m = book.sheet("Ensayo Marshall")
    m.put(1, 1, "ENSAYO MARSHALL UNE-EN 12697-34 (75 golpes por cara)", bold=True)
    m.row(3, 1, ["% betún s/m", "Probeta", "Peso en aire (g)", "Peso en agua (g)", "Peso sat. sup. seca (g)", "Densidad (kg/m³)",
                 "Densidad máx. (kg/m³)", "Huecos mezcla (%)", "Huecos áridos (%)", "Estabilidad (kN)", "Deformación (mm)"], wrap=True)
    row = 4
    for pb in [4.2, 4.7, 5.2, 5.7]:
        trial = str(pb)
        rho = round(mix.true_gmm(pb) * 997.1)
        for n in range(1, 4):
            dry, water, ssd, gmb = mix.masses(pb, mass=1180)
            at = {"trial": trial, "specimen": str(n)}
            density = round(gmb * 997.1)
            if n == 1:
                m.read(row, 1, "binder-content", pb, {"trial": trial}, text=str(pb).replace(".", ","))
                m.read(row, 7, "maximum-density-mix", rho, {"trial": trial})
            va = 100 * (1 - density / rho)
            m.put(row, 2, n).read(row, 3, "mass-in-air", dry, at).read(row, 4, "mass-in-water", water, at)
            m.read(row, 5, "mass-saturated-surface-dry", ssd, at).read(row, 6, "bulk-density-mix", density, at)
            m.read(row, 8, "air-voids", rounded(va, 1), at)
            m.read(row, 9, "voids-in-mineral-aggregate", rounded(100 - gmb * (100 - pb) / mix.gsb, 1), at)
            m.read(row, 10, "marshall-stability", rounded(13.4 - 1.2 * (pb - 4.8) ** 2 + mix.noise(0.5), 1), at, may={"temperature": 60})
            m.read(row, 11, "marshall-flow", rounded(2.6 + 0.6 * (pb - 4.2) + mix.noise(0.15), 1), at, may={"temperature": 60})
            row += 1
        m.put(row, 1, "Media", bold=True).put(row, 8, "-")
        row += 1
    return book, lambda path: with_openpyxl(book, path)


BOOKS = {
    "03-tollhouse-marshall-de": marshall_text,
    "04-kestrel-erstpruefung": german,
    "05-formulation-fr": french,
    "06-formula-de-trabajo": spanish,
}
