"""Writers: three programs that laboratories' files come from, and text files."""

import csv
import datetime
import json
import os
import re
import shutil
import subprocess
import tempfile
import zipfile

import openpyxl
import xlsxwriter
from openpyxl.comments import Comment
from openpyxl.styles import Alignment, Font
from openpyxl.utils import get_column_letter

UNITS = json.load(open(os.path.join(os.path.dirname(__file__), "units.json")))


def write_truth(book, folder, name, file):
    with open(os.path.join(folder, f"{name}.truth.json"), "w", encoding="utf-8") as out:
        json.dump(book.truth(file), out, ensure_ascii=False, indent=2)
        out.write("\n")


def with_xlsxwriter(book, path, date1904=False, inline=False):
    options = {"constant_memory": inline, "date_1904": date1904, "default_date_format": "yyyy-mm-dd"}
    work = xlsxwriter.Workbook(path, options)
    work.set_properties({"created": datetime.datetime(2026, 3, 2, 9, 0, 0)})
    for sheet in book.sheets:
        page = work.add_worksheet(sheet.name)
        if sheet.hidden:
            page.hide()
        for column, width in sheet.widths.items():
            page.set_column(column - 1, column - 1, width)
        for row in sheet.hidden_rows:
            page.set_row(row - 1, None, None, {"hidden": True})
        for column in sheet.hidden_columns:
            page.set_column(column - 1, column - 1, None, None, {"hidden": True})
        merged = {(r, c): (r, c, r2, c2) for r, c, r2, c2 in sheet.merges}
        for (row, column), cell in sorted(sheet.cells.items()):
            style = {}
            if cell.bold:
                style["bold"] = True
            if cell.italic:
                style["italic"] = True
            if cell.wrap:
                style["text_wrap"] = True
            if cell.fmt:
                style["num_format"] = cell.fmt
            elif isinstance(cell.value, (datetime.date, datetime.datetime)):
                style["num_format"] = "dd/mm/yyyy"
            form = work.add_format(style) if style else None
            if (row, column) in merged and not inline:
                r, c, r2, c2 = merged[(row, column)]
                page.merge_range(r - 1, c - 1, r2 - 1, c2 - 1, "", form)
            if cell.formula:
                page.write_formula(row - 1, column - 1, cell.formula, form, cell.value)
            elif isinstance(cell.value, (datetime.date, datetime.datetime)):
                page.write_datetime(row - 1, column - 1, cell.value, form)
            elif isinstance(cell.value, str):
                page.write_string(row - 1, column - 1, cell.value, form)
            else:
                page.write_number(row - 1, column - 1, cell.value, form)
            if cell.comment:
                page.write_comment(row - 1, column - 1, cell.comment)
    work.close()


def with_openpyxl(book, path, date1904=False, cached=True):
    """Formulas go in without results; `cached=False` leaves them so, else the office program computes them."""
    work = openpyxl.Workbook()
    work.remove(work.active)
    if date1904:
        work.epoch = openpyxl.utils.datetime.CALENDAR_MAC_1904
    for sheet in book.sheets:
        page = work.create_sheet(sheet.name)
        if sheet.hidden:
            page.sheet_state = "hidden"
        for (row, column), cell in sorted(sheet.cells.items()):
            target = page.cell(row, column)
            target.value = cell.formula if cell.formula else cell.value
            if cell.fmt:
                target.number_format = cell.fmt
            elif isinstance(cell.value, datetime.date):
                target.number_format = "yyyy-mm-dd"
            if cell.bold or cell.italic:
                target.font = Font(bold=cell.bold, italic=cell.italic)
            if cell.wrap:
                target.alignment = Alignment(wrap_text=True)
            if cell.comment:
                target.comment = Comment(cell.comment, "lab")
        for r, c, r2, c2 in sheet.merges:
            page.merge_cells(start_row=r, start_column=c, end_row=r2, end_column=c2)
        for row in sheet.hidden_rows:
            page.row_dimensions[row].hidden = True
        for column in sheet.hidden_columns:
            page.column_dimensions[get_column_letter(column)].hidden = True
        for column, width in sheet.widths.items():
            page.column_dimensions[get_column_letter(column)].width = width
    work.save(path)


def with_office(book, path, kind="xlsx", **options):
    """Written, opened, computed and saved again by an office program."""
    with tempfile.TemporaryDirectory() as folder:
        source = os.path.join(folder, "source.xlsx")
        with_openpyxl(book, source, **options)
        out = os.path.join(folder, "out")
        target = {"xlsx": "xlsx:Calc MS Excel 2007 XML"}.get(kind, kind)
        subprocess.run(
            ["soffice", f"-env:UserInstallation=file://{folder}/profile", "--headless", "--convert-to", target,
             "--outdir", out, source],
            check=True, capture_output=True,
        )
        made = os.path.join(out, os.listdir(out)[0])
        shutil.copyfile(made, path)


def take_results(book, path):
    """The result of a formula is what the office program computed; ours must agree with it."""
    work = openpyxl.load_workbook(path, data_only=True)
    for reading in book.readings + book.optional:
        cell = work[reading["sheet"]][reading["cell"]].value
        if isinstance(cell, (int, float)) and cell != reading["written"]:
            ours = reading["written"]
            assert abs(cell - ours) <= 1e-6 * max(1, abs(ours)), (reading, cell)
            scale = reading["value"] / ours if ours else 1
            reading["written"] = cell
            reading["value"] = cell if reading["unit"] == reading["writtenUnit"] else cell * scale


def with_text(sheet, path, delimiter=";", encoding="cp1252", comma=False):
    rows = max(r for r, _ in sheet.cells)
    columns = max(c for _, c in sheet.cells)

    def shown(cell):
        if cell is None:
            return ""
        value = cell.value
        if isinstance(value, bool) or isinstance(value, str):
            return value
        if isinstance(value, datetime.date):
            return value.strftime(cell.fmt or "%Y-%m-%d")
        text = cell.fmt % value if cell.fmt else repr(value)
        return text.replace(".", ",") if comma else text

    with open(path, "w", encoding=encoding, newline="") as out:
        writer = csv.writer(out, delimiter=delimiter, lineterminator="\r\n")
        for row in range(1, rows + 1):
            writer.writerow([shown(sheet.cells.get((row, column))) for column in range(1, columns + 1)])


def settle(path):
    """The same bytes each time: no clock in the zip or in the properties."""
    if not path.endswith(".xlsx"):
        return
    with zipfile.ZipFile(path) as source:
        parts = [(info.filename, source.read(info)) for info in source.infolist()]
    with zipfile.ZipFile(path, "w", zipfile.ZIP_DEFLATED) as out:
        for name, data in parts:
            if name == "docProps/core.xml":
                data = re.sub(rb"(<dcterms:(created|modified)[^>]*>)[^<]*", rb"\g<1>2026-03-02T09:00:00Z", data)
            out.writestr(zipfile.ZipInfo(name, (2026, 3, 2, 9, 0, 0)), data, zipfile.ZIP_DEFLATED)
