"""Proves each truth against its file: the figure stands at its cell and turns into the value; prints sheets as text."""

import csv
import glob
import json
import os
import sys

import openpyxl

HERE = os.path.dirname(os.path.abspath(__file__))
sys.path.insert(0, HERE)
from lab import canonical, column_letters, number_in  # noqa: E402

UNITS = json.load(open(os.path.join(HERE, "units.json")))
TEXT = json.load(open(os.path.join(HERE, "text-files.json")))


def cells_of(path):
    name = os.path.basename(path)
    if path.endswith(".xlsx"):
        work = openpyxl.load_workbook(path, data_only=True)
        return {(s.title, c.coordinate): c.value for s in work for row in s.iter_rows() for c in row if c.value is not None}
    how = TEXT[name]
    with open(path, encoding=how["encoding"], newline="") as source:
        rows = list(csv.reader(source, delimiter=how["delimiter"]))
    return {("", f"{column_letters(c)}{r}"): v for r, row in enumerate(rows, 1) for c, v in enumerate(row, 1) if v != ""}


def number(value, comma, part):
    if isinstance(value, (int, float)):
        return float(value)
    if value.startswith(">20,"):
        return 20000.0
    text = number_in(value.replace("> 20 000", "20000").replace(">20,000", "20000"), part)
    if comma:
        text = text.replace(".", "").replace(",", ".") if text.count(",") else text
    return float(text.rstrip(".,").replace(",", ""))


def check(path):
    truth = json.load(open(path, encoding="utf-8"))
    file = os.path.join(os.path.dirname(path), truth["file"])
    cells = cells_of(file)
    comma = TEXT.get(os.path.basename(file), {}).get("comma", False)
    seen, faults = {}, []
    for reading in truth["readings"] + truth["optional"]:
        place = (reading["sheet"], reading["cell"])
        found = cells.get(place)
        if found is None:
            faults.append(f"{place} is empty: {reading}")
            continue
        ours_comma = comma or (isinstance(found, str) and "," in found)
        value = number(found, ours_comma, reading.get("part", 0))
        unit = reading["writtenUnit"]
        if unit == "fraction":
            value = round(value * 100, 10)
        else:
            value = canonical(value, unit, UNITS[reading["quantity"]])
        if abs(value - reading["value"]) > 1e-9 * max(1, abs(value)):
            faults.append(f"{place} holds {found!r}, truth {reading['value']}")
    for reading in truth["readings"]:
        key = json.dumps([reading["quantity"], reading.get("qualifier"), reading["at"]], sort_keys=True)
        other = seen.setdefault(key, reading)
        if other is not reading and abs(other["value"] - reading["value"]) > 1e-6:
            faults.append(f"{key} is both {other['value']} ({other['sheet']}!{other['cell']}) and {reading['value']} ({reading['sheet']}!{reading['cell']})")
    places = [(r["sheet"], r["cell"], r["quantity"]) for r in truth["readings"]]
    twice = {p for p in places if places.count(p) > 1}
    faults += [f"{p} twice" for p in twice]
    return truth, faults, len(seen)


def show(path, sheet=None):
    cells = cells_of(path)
    truth = json.load(open(path.rsplit(".", 1)[0] + ".truth.json", encoding="utf-8"))
    real = {(r["sheet"], r["cell"]) for r in truth["readings"]}
    maybe = {(r["sheet"], r["cell"]) for r in truth["optional"]}
    sheets = {}
    for (name, place), value in cells.items():
        letters = place.rstrip("0123456789")
        column = 0
        for letter in letters:
            column = column * 26 + ord(letter) - 64
        mark = "" if (name, place) not in real | maybe else ("*" if (name, place) in real else "?")
        shown = f"{value:.6g}" if isinstance(value, float) else str(value)
        sheets.setdefault(name, {})[(int(place[len(letters):]), column)] = shown.replace("\n", "/") + mark
    for name, found in sheets.items():
        if sheet and sheet != name:
            continue
        print(f"=== {name}")
        for row in range(1, max(r for r, _ in found) + 1):
            line = [found.get((row, c), "") for c in range(1, max([c for r, c in found if r == row], default=0) + 1)]
            print(f"{row:3} " + " | ".join(line))


if __name__ == "__main__":
    if sys.argv[1] == "show":
        show(*sys.argv[2:])
    else:
        total = 0
        for path in sorted(glob.glob(os.path.join(HERE, sys.argv[1], "*.truth.json"))):
            truth, faults, keys = check(path)
            total += keys
            print(f"{truth['file']}: {keys} readings, {len(truth['optional'])} optional, {len(truth['attributes'])} attributes, "
                  f"{len(truth['documents'])} documents, {len(truth['doubts'])} doubts, {len(faults)} faults")
            for fault in faults[:8]:
                print("   ", fault)
        print(total)
