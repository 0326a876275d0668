"""Makes every workbook of one set with its truth: `python3 make.py set-1 [NN]`."""

import importlib
import os
import sys

HERE = os.path.dirname(os.path.abspath(__file__))


def main(name, only=None):
    folder = os.path.join(HERE, name)
    sys.path[:0] = [HERE, folder]
    from files import settle, take_results, write_truth

    parts = sorted(f[:-3] for f in os.listdir(folder) if f.startswith("part_") and f.endswith(".py"))
    for part in parts:
        for title, make in importlib.import_module(part).BOOKS.items():
            if only and not title.startswith(only):
                continue
            book, write = make()
            file = title + getattr(make, "extension", ".xlsx")
            path = os.path.join(folder, file)
            write(path)
            settle(path)
            if file.endswith(".xlsx"):
                take_results(book, path)
            write_truth(book, folder, title, file)
            print(title, len(book.readings), "readings", len(book.optional), "optional")


if __name__ == "__main__":
    main(*sys.argv[1:])
