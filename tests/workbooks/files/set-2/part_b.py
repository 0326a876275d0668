"""Laboratories that write German, French and Spanish, with habits of their own."""

import datetime
import math

from files import UNITS, with_office, with_openpyxl, with_text
from lab import Book
from mixes import Mix, mean, rounded


def pruefbericht():
    """Extracted mix: retained classes and passing falling, two determinations and their mean."""
    book = Book(UNITS)
    mix = Mix(2204, 4.4, 2.758, absorption=0.3, gb=1.024, target=5.0, slope=1.7, mass=1260)
    s = book.sheet("Prüfbericht")
    s.put(1, 1, "PRÜFBERICHT Nr. 26/0188", bold=True).merge(1, 1, 5)
    s.put(2, 1, "Asphaltbinderschicht AC 16 B S, Entnahme am Mischwerk")
    s.put(4, 1, "Entnahmedatum").put(4, 3, "2026-05-06").put(5, 1, "Prüfdatum").put(5, 3, datetime.date(2026, 5, 8), fmt="DD.MM.YYYY")
    s.put(7, 1, "1. Zusammensetzung", bold=True)
    s.row(8, 1, ["Merkmal", "Einheit", "Bestimmung 1", "Bestimmung 2", "Mittelwert", "Soll", "Toleranz"], wrap=True)
    pair = [rounded(4.4 + mix.noise(0.07), 2) for _ in range(2)]
    s.put(9, 1, "Löslicher Bindemittelgehalt").put(9, 2, "M.-%")
    for k in (0, 1):
        s.read(9, 3 + k, "binder-content", pair[k], {"specimen": f"{k + 1}"}, fmt="0.00")
    s.put(9, 5, mean(pair), fmt="0.0").maybe(9, 6, "binder-content", 4.4, {"trial": "design"}, fmt="0.0").put(9, 7, "± 0,4")
    s.put(10, 1, "Rohdichte Asphalt").put(10, 2, "g/cm³")
    rho = [rounded(mix.true_gmm(4.4) * 0.9971 + mix.noise(0.003), 3) for _ in range(2)]
    for k in (0, 1):
        s.read(10, 3 + k, "maximum-density-mix", rho[k], {"specimen": f"{k + 1}"}, unit="g/cm³", fmt="0.000")
    s.put(10, 5, mean(rho), fmt="0.000")
    s.put(11, 1, "Erweichungspunkt RuK (rückgew.)").put(11, 2, "°C").maybe(11, 3, "softening-point", 61.2, {"specimen": "1"}, fmt="0.0")
    s.maybe(11, 4, "softening-point", 60.8, {"specimen": "2"}, fmt="0.0").put(11, 5, 61.0, fmt="0.0").put(11, 7, "max. 71")
    s.put(13, 1, "2. Korngrößenverteilung", bold=True)
    s.row(14, 1, ["Siebweite", "Rückstand", "Siebdurchgang", "Soll", "Toleranz"]).row(15, 1, ["mm", "M.-%", "M.-%", "M.-%", "±"])
    rows = [(22.4, 0, 100, None), (16, 4.1, 97, 5), (11.2, 21.6, 75, 6), (8, 16.2, 58, 6), (5.6, 11.4, 47, 6), (2, 17.2, 30, 5), (0.125, 20.7, 9, 3),
            (0.063, 2.4, 6.5, 2)]
    passing = 100.0
    for r, (sieve, retained, target, tolerance) in enumerate(rows, 16):
        passing = rounded(passing - retained, 1)
        at = {"sieve": sieve}
        s.put(r, 1, sieve).read(r, 2, "percent-retained", retained, at, fmt="0.0").read(r, 3, "percent-passing", passing, at, fmt="0.0")
        s.maybe(r, 4, "percent-passing", target, {**at, "trial": "design"}).put(r, 5, tolerance)
    s.put(24, 1, "< 0,063").put(24, 2, passing, fmt="0.0").put(25, 1, "Summe").put(25, 2, 100.0, fmt="0.0")
    s.put(27, 1, "3. Marshall-Probekörper", bold=True)
    s.row(28, 1, ["Probekörper", "Höhe (mm)", "Raumdichte (g/cm³)", "Hohlraumgehalt (Vol.-%)"])
    for n in range(1, 5):
        gmb = mix.gmb(4.4, voids=5.0)
        density = rounded(gmb * 0.9971, 3)
        at = {"specimen": f"MPK {n}"}
        s.put(28 + n, 1, at["specimen"]).read(28 + n, 2, "specimen-height", rounded(1260 / gmb / 8.107 + mix.noise(0.2), 1), at, fmt="0.0")
        s.read(28 + n, 3, "bulk-density-mix", density, at, unit="g/cm³", fmt="0.000")
        s.read(28 + n, 4, "air-voids", 100 * (1 - density / mean(rho)), at, fmt="0.0", formula=f"=(1-C{28 + n}/$E$10)*100")
    s.put(33, 1, "Mittel").put(33, 3, 0, formula="=AVERAGE(C29:C32)", fmt="0.000").put(33, 4, 0, formula="=AVERAGE(D29:D32)", fmt="0.0")
    book.note("The targets stand beside an extracted sample; the sample's gradation and the target share one place when a trial is not named.")
    s.put(10, 5, mean(rho), fmt="0.000", formula="=AVERAGE(C10:D10)").put(9, 5, mean(pair), fmt="0.0", formula="=AVERAGE(C9:D9)")
    return book, lambda path: with_office(book, path)


def spurbildung():
    """A device's export: UTF-8 with a mark, semicolons, decimal commas, thousands with points."""
    book = Book(UNITS, flat=True)
    mix = Mix(2205, 5.8, 2.7)
    s = book.sheet("")
    s.put(1, 1, "Spurbildungsversuch EN 12697-22 Verfahren B in Luft").put(2, 1, "Prüftemperatur").put(2, 2, "60").put(2, 3, "°C")
    s.put(3, 1, "Lastzyklen").put(3, 2, "10.000").put(5, 1, "Zyklen").put(5, 2, "Spurtiefe [mm]").put(5, 3, "Spurtiefe [mm]")
    s.put(6, 2, "Platte 1").put(6, 3, "Platte 2")
    for r, cycles in enumerate([100, 500, 1000, 2000, 4000, 5000, 6000, 8000, 10000], 7):
        s.put(r, 1, f"{cycles:,}".replace(",", "."))
        for c in (0, 1):
            depth = rounded(0.34 * (cycles / 100) ** 0.43 * (1 + 0.07 * c) + mix.noise(0.01), 2)
            s.read(r, 2 + c, "wheel-track-rut-depth", depth, {"specimen": f"Platte {c + 1}", "passes": cycles, "temperature": 60}, fmt="%.2f")
    s.put(17, 1, "WTS LUFT [mm/1000 Zyklen]")
    s.put(18, 1, "PRD LUFT [%]")
    for c in (0, 1):
        at = {"specimen": f"Platte {c + 1}", "temperature": 60}
        s.read(17, 2 + c, "wheel-track-slope", rounded(0.07 + 0.006 * c, 3), at, fmt="%.3f", may={"passes": 10000})
        s.read(18, 2 + c, "proportional-rut-depth", rounded(5.9 + 0.4 * c, 1), at, fmt="%.1f", may={"passes": 10000})
    return book, lambda path: with_text(s, path, delimiter=";", encoding="utf-8-sig", comma=True)


spurbildung.extension = ".csv"


def marshall_fr():
    """French text file: compactness in place of voids as well, sections one below the other."""
    book = Book(UNITS, flat=True)
    mix = Mix(2206, 5.4, 2.69, absorption=0.4, gb=1.027, target=4.2, slope=1.8, mass=1200)
    s = book.sheet("")
    s.put(1, 1, "Laboratoire - Essai Marshall NF EN 12697-34").put(2, 1, "Formule").put(2, 2, "BB 0/10").put(3, 1, "Bitume").put(3, 2, "50/70")
    book.know("binderGrade", "50/70")
    s.put(4, 1, "Date").put(4, 2, "9 mars 2026").put(6, 1, "Teneur en liant (%)").put(6, 2, "Éprouvette").put(6, 3, "Hauteur (mm)")
    s.row(6, 4, ["Masse dans l'air (g)", "Masse dans l'eau (g)", "Masse SSS (g)", "MVA (g/cm³)", "Vides (%)", "Stabilité (kN)", "Fluage (mm)"])
    row = 7
    for pb in (4.9, 5.4, 5.9):
        rho = mix.true_gmm(pb) * 0.9971
        rows = []
        for n in (1, 2, 3, 4):
            at = {"trial": str(pb), "specimen": str(n)}
            dry, water, ssd, gmb = mix.masses(pb, mass=1200)
            density = rounded(gmb * 0.9971, 3)
            rows.append(density)
            if n == 1:
                s.read(row, 1, "binder-content", pb, {"trial": str(pb)}, fmt="%.1f")
            s.put(row, 2, n).read(row, 3, "specimen-height", rounded((ssd - water) / 8.107 + mix.noise(0.1), 1), at, fmt="%.1f")
            s.read(row, 4, "mass-in-air", dry, at, fmt="%.1f").read(row, 5, "mass-in-water", water, at, fmt="%.1f")
            s.read(row, 6, "mass-saturated-surface-dry", ssd, at, fmt="%.1f")
            s.read(row, 7, "bulk-density-mix", density, at, unit="g/cm³", fmt="%.3f")
            s.read(row, 8, "air-voids", rounded(100 * (1 - density / rho), 1), at, fmt="%.1f")
            s.read(row, 9, "marshall-stability", rounded(12.1 - (pb - 5.3) ** 2 + mix.noise(0.4), 1), at, fmt="%.1f")
            s.read(row, 10, "marshall-flow", rounded(2.7 + 0.9 * (pb - 4.9) + mix.noise(0.15), 1), at, fmt="%.1f")
            row += 1
        s.put(row, 2, "Moy.").put(row, 7, mean(rows), fmt="%.3f")
        row += 1
    row += 1
    s.put(row, 1, "Analyse granulométrique du mélange").put(row + 1, 1, "Tamis (mm)").put(row + 1, 2, "Refus cumulé (%)").put(row + 1, 3, "Tamisat (%)")
    for r, (sieve, passing) in enumerate([(14, 100), (10, 95.8), (6.3, 71.4), (4, 56.2), (2, 38.7), (1, 27.9), (0.25, 13.4), (0.063, 6.9)], row + 2):
        s.put(r, 1, sieve).read(r, 2, "cumulative-percent-retained", rounded(100 - passing, 1), {"sieve": sieve}, fmt="%.1f")
        s.read(r, 3, "percent-passing", passing, {"sieve": sieve}, fmt="%.1f")
    return book, lambda path: with_text(s, path, delimiter=";", encoding="cp1252", comma=True)


marshall_fr.extension = ".csv"


def spanish():
    """Water sensitivity, wheel tracking and aggregates of a Spanish laboratory; many figures are text."""
    book = Book(UNITS)
    mix = Mix(2207, 5.0, 2.65)
    a = book.sheet("Áridos")
    a.put(1, 1, "ÁRIDOS", bold=True).row(3, 1, ["Ensayo", "Norma", "Resultado", "Exigido"])
    rows = [("Desgaste Los Ángeles", "UNE-EN 1097-2", "abrasion-loss", "17 %", 17, {}, "≤ 20"),
            ("Equivalente de arena", "UNE-EN 933-8", "sand-equivalent", "64", 64, {}, "> 55"),
            ("Coeficiente de pulimento acelerado", "UNE-EN 1097-8", "polished-stone-value", "56", 56, {}, "≥ 50"),
            ("Absorción de agua", "UNE-EN 1097-6", "water-absorption", "0,82 %", 0.82, {}, "-"),
            ("Azul de metileno (g/kg)", "UNE-EN 933-9", "methylene-blue-value", "3,1", 3.1, {}, "< 10")]
    for r, (label, norm, quantity, text, value, at, limit) in enumerate(rows, 4):
        a.put(r, 1, label).put(r, 2, norm).read(r, 3, quantity, value, at, text=text).put(r, 4, limit)
    g = book.sheet("Granulometría")
    g.put(1, 1, "Tamices (mm)").row(1, 2, [22, 16, 11.2, 8, 4, 2, 0.5, 0.25, 0.063]).put(2, 1, "Curva de trabajo (% pasa)", bold=True)
    g.put(3, 1, "Huso mín.").row(3, 2, [100, 90, None, 60, 35, 24, 11, 7, 3]).put(4, 1, "Huso máx.").row(4, 2, [100, 100, None, 75, 50, 38, 21, 15, 7])
    for c, (sieve, value) in enumerate(zip([22.4, 16, 11.2, 8, 4, 2, 0.5, 0.25, 0.063], ["100", "96,2", "82,0", "67,4", "43,1", "31,5", "16,8", "10,9", "5,7"]), 2):
        g.read(2, c, "percent-passing", float(value.replace(",", ".")), {"trial": "design", "sieve": sieve}, text=value)
    w = book.sheet("Sensibilidad al agua")
    w.put(1, 1, "UNE-EN 12697-12, 15 °C", bold=True)
    w.put(3, 1, "Probetas en seco").merge(3, 1, 4).put(3, 6, "Probetas en húmedo").merge(3, 6, 4)
    heads = ["Nº", "Altura (mm)", "Carga (kN)", "RTI (kPa)"]
    w.row(4, 1, heads).row(4, 6, heads)
    sums = [[], []]
    for n in range(4):
        for wet in (0, 1):
            left, name = 1 + 5 * wet, str(n + 1 + 4 * wet)
            height = rounded(62.5 + mix.noise(0.6), 1)
            load = rounded(((1690 if wet else 1880) + mix.noise(40)) * math.pi * height * 101.6 / 2e6, 2)
            value = round(2e6 * load / (math.pi * height * 101.6))
            sums[wet].append(value)
            at, may = {"specimen": name}, {"temperature": 15}
            w.put(5 + n, left, int(name)).read(5 + n, left + 1, "specimen-height", height, at, fmt="0.0")
            w.read(5 + n, left + 2, "failure-load", load, at, fmt="0.00", may=may)
            w.read(5 + n, left + 3, "tensile-strength-conditioned" if wet else "tensile-strength-dry", value, at, may=may)
    w.put(9, 3, "Media").put(9, 4, mean(sums[0]), fmt="0").put(9, 8, "Media").put(9, 9, mean(sums[1]), fmt="0")
    w.put(11, 1, "Resistencia conservada (ITSR)").read(11, 4, "tensile-strength-ratio", round(100 * mean(sums[1]) / mean(sums[0])), {}, text=f"{round(100 * mean(sums[1]) / mean(sums[0]))} %")
    w.put(12, 1, "Mínimo").put(12, 4, "85 %")
    p = book.sheet("Pista")
    p.put(1, 1, "Ensayo de rodadura UNE-EN 12697-22, 60 °C, 10 000 ciclos", bold=True)
    p.row(3, 1, ["Probeta", "WTS aire (mm/10³ ciclos)", "PRD aire (%)"])
    for n in (1, 2):
        at = {"specimen": str(n), "temperature": 60}
        p.put(3 + n, 1, n).read(3 + n, 2, "wheel-track-slope", [0.06, 0.064][n - 1], at, fmt="0.000").read(3 + n, 3, "proportional-rut-depth", [4.2, 4.6][n - 1], at)
    p.put(6, 1, "Media").put(6, 2, 0.062).put(6, 3, 4.4).put(7, 1, "Límite").put(7, 2, 0.07)
    book.note("The sieve called 22 in the trade is the 22.4 mm one.")
    for reading in book.readings:
        if reading["quantity"] in ("wheel-track-slope", "proportional-rut-depth"):
            reading["may"] = {**reading["may"], "passes": 10000}
    return book, lambda path: with_openpyxl(book, path)


BOOKS = {"04-pruefbericht": pruefbericht, "05-spurbildung": spurbildung, "06-marshall-fr": marshall_fr, "07-sensibilidad": spanish}
