"""Sheets that are laid out by hand, each figure put down together with what it means."""

import re

LBF = 0.0044482216152605
PSI = 6.894757293168361
FACTORS = {
    ("psi", "kPa"): PSI,
    ("MPa", "kPa"): 1000.0,
    ("N/mm²", "kPa"): 1000.0,
    ("lbf", "kN"): LBF,
    ("N", "kN"): 0.001,
    ("kgf", "kN"): 0.00980665,
    ("in", "mm"): 25.4,
    ("cm", "mm"): 10.0,
    ("0.01 in", "mm"): 0.254,
    ("0.25 mm", "mm"): 0.25,
    ("ksi", "MPa"): PSI,
    ("kPa", "MPa"): 0.001,
    ("GPa", "MPa"): 1000.0,
    ("psi", "MPa"): PSI / 1000,
    ("lb/ft³", "kg/m³"): 16.018463373960142,
    ("g/cm³", "kg/m³"): 1000.0,
    ("Mg/m³", "kg/m³"): 1000.0,
    ("cP", "Pa·s"): 0.001,
    ("mPa·s", "Pa·s"): 0.001,
    ("P", "Pa·s"): 0.1,
    ("1/psi", "1/GPa"): 1e6 / PSI,
    ("1/MPa", "1/GPa"): 1000.0,
    ("kg", "g"): 1000.0,
    ("mm", "µm"): 1000.0,
    ("in", "µm"): 25400.0,
    ("mm", "dmm"): 10.0,
    ("kJ/m²", "J/m²"): 1000.0,
    ("N/mm", "kN/mm"): 0.001,
    ("N/m", "kN/mm"): 1e-6,
    ("min", "h"): 1 / 60,
    ("fraction", "%"): 100.0,
    ("percent", "1"): 0.01,
    ("mm/mm", "µε"): 1e6,
}


# Quantities that are told apart without the temperature of the test: it may be recorded or not.
WITHOUT_TEMPERATURE = {
    "flow-number",
    "stripping-inflection-point",
    "passes-to-rut-depth",
    "wheel-track-slope",
    "proportional-rut-depth",
}


def canonical(value, written, unit):
    if written == unit:
        return value
    if (written, unit) == ("°F", "°C"):
        return (value - 32) / 1.8
    return value * FACTORS[(written, unit)]


def column_letters(column):
    letters = ""
    while column:
        column, rest = divmod(column - 1, 26)
        letters = chr(65 + rest) + letters
    return letters


def address(row, column):
    return f"{column_letters(column)}{row}"


class Cell:
    def __init__(self, value, fmt=None, bold=False, formula=None, comment=None, wrap=False, italic=False):
        self.value = value
        self.fmt = fmt
        self.bold = bold
        self.formula = formula
        self.comment = comment
        self.wrap = wrap
        self.italic = italic


class Sheet:
    def __init__(self, book, name, hidden=False):
        self.book = book
        self.name = name
        self.hidden = hidden
        self.cells = {}
        self.merges = []
        self.hidden_rows = []
        self.hidden_columns = []
        self.widths = {}

    def put(self, row, column, value, **style):
        """Words, keys, limits, averages: no reading."""
        if value is not None:
            self.cells[(row, column)] = Cell(value, **style)
        return self

    def row(self, row, column, values, **style):
        for at, value in enumerate(values):
            self.put(row, column + at, value, **style)
        return self

    def down(self, row, column, values, **style):
        for at, value in enumerate(values):
            self.put(row + at, column, value, **style)
        return self

    def merge(self, row, column, columns, rows=1):
        self.merges.append((row, column, row + rows - 1, column + columns - 1))
        return self

    def read(self, row, column, quantity, value, at=None, unit=None, text=None, may=None, optional=False,
             qualifier=None, part=None, **style):
        """A figure that is a reading: `unit` as written, `text` what stands in the cell where that is no number."""
        own = self.book.units[quantity]
        at = dict(at or {})
        if quantity in WITHOUT_TEMPERATURE and "temperature" in at:
            may = {**(may or {}), "temperature": at.pop("temperature")}
        unit = unit or own
        self.put(row, column, value if text is None else text, **style)
        if unit == "fraction" and text is None:
            true = round(value * 100, 10)
        else:
            true = canonical(value, unit, own)
        reading = {"quantity": quantity, "value": true, "unit": own, "at": at}
        if qualifier:
            reading["qualifier"] = qualifier
        if may:
            reading["may"] = may
        if part is not None:
            reading["part"] = part
        reading["sheet"] = "" if self.book.flat else self.name
        reading["cell"] = address(row, column)
        reading["written"] = value if text is None else text
        reading["writtenUnit"] = unit
        (self.book.optional if optional else self.book.readings).append(reading)
        return self

    def maybe(self, *args, **kwargs):
        """A reading that a careful reader may take or leave."""
        return self.read(*args, optional=True, **kwargs)

    def doubt(self, row, column, why, value=None, **style):
        """A cell that must not become a reading: a doubt or unread."""
        if value is not None:
            self.put(row, column, value, **style)
        self.book.doubts.append(
            {"sheet": "" if self.book.flat else self.name, "cell": address(row, column), "why": why}
        )
        return self


class Book:
    def __init__(self, units, flat=False):
        self.units = units
        self.flat = flat
        self.sheets = []
        self.readings = []
        self.optional = []
        self.doubts = []
        self.attributes = {}
        self.documents = []
        self.notes = []

    def sheet(self, name, **options):
        sheet = Sheet(self, name, **options)
        self.sheets.append(sheet)
        return sheet

    def know(self, name, value):
        self.attributes[name] = value

    def document(self, kind, date=None, valid_to=None):
        self.documents.append({"type": kind, "date": date, "validTo": valid_to})

    def note(self, text):
        self.notes.append(text)

    def truth(self, file):
        """Plain replicates and repeats of one value at one place in the record count once."""
        return {
            "file": file,
            "readings": self.readings,
            "attributes": self.attributes,
            "documents": self.documents,
            "optional": self.optional,
            "doubts": self.doubts,
            "notes": self.notes,
        }


def number_in(text, part=0):
    found = re.findall(r"[-+−]?\d[\d.,]*(?:[eE][-+]?\d+)?", str(text).replace("\u00a0", "").replace("\u202f", ""))
    return found[part].replace("−", "-") if found else None
