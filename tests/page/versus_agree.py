"""versus_agree.py FOLDER: reads the page, the JSON and the CSV of each pair of
runs back, with Python's own parsers, and finds the same numbers in all of them.

JSON has every digit and is what the others are held against, and itself against
its own definition: a change is (b - a) / |a|.
"""

import csv
import json
import math
import pathlib
import statistics
import sys

from formats_agree import PAGE_DATA_ERROR, Page, arc_text, number, same
from formats_agree import percent, with_uncertainty

# A change is a difference of nearly equal numbers, in doubles.
CHANGE_ERROR = 1e-9


def value(row, name):
    return row[name]["value"] if row[name] else None


def check_changes(path, arcs):
    for i, arc in enumerate(arcs):
        for name in ("effort", "parasitic"):
            change = arc[f"{name}_change"]
            a, b = value(arc["a"], name), value(arc["b"], name)
            if a is None or b is None:
                same(f"{path}: change {i + 1}", change, None)
                continue
            if not math.isclose(change["relative"], (b - a) / abs(a),
                                rel_tol=CHANGE_ERROR, abs_tol=CHANGE_ERROR):
                raise SystemExit(f"versus_agree: {path}: arc {i + 1}: {name} "
                                 f"{a} to {b} is not {change['relative']}")


def check_spread(path, report):
    for figure, name in (("g", "effort"), ("p", "parasitic")):
        changes = [arc[f"{name}_change"]["relative"] for arc in report["arcs"]
                   if arc[f"{name}_change"]]
        spread = report["spread"][figure]
        same(f"{path}: {figure} count", spread["count"], len(changes))
        if len(changes) < 2:
            continue
        same(f"{path}: {figure} mean", spread["mean"],
             statistics.fmean(changes), CHANGE_ERROR)
        same(f"{path}: {figure} deviation", spread["deviation"],
             statistics.stdev(changes), CHANGE_ERROR)
        same(f"{path}: {figure} within", spread["within_10_percent"],
             sum(abs(change) <= 0.1 for change in changes))


def expected(arc):
    """A pair of the JSON report under the CSV report's names."""
    row = {"finding": arc["finding"]}
    for side in ("a", "b"):
        row[f"corner_{side}"] = arc[f"corner_{side}"]
        row[f"verdict_{side}"] = arc[side]["verdict"]
        row[f"g_hand_{side}"] = arc[side]["effort_by_hand"]
        for figure, name in (("g", "effort"), ("p", "parasitic")):
            measured = arc[side][name]
            row[f"{figure}_{side}"] = measured and measured["value"]
            row[f"{figure}_u_{side}"] = measured and measured["u"]
    for figure, name in (("g", "effort"), ("p", "parasitic")):
        change = arc[f"{name}_change"]
        row[f"{figure}_change"] = change and change["relative"]
        row[f"{figure}_change_expanded"] = change and change["expanded"]
    return row


def check_csv(path, report):
    with open(path, newline="", encoding="utf-8") as file:
        read = list(csv.DictReader(file, strict=True))
    arcs = report["arcs"]
    same(f"{path}: rows", len(read),
         len(arcs) + len(report["only_a"]) + len(report["only_b"]))
    for i, (got, arc) in enumerate(zip(read, arcs)):
        for name, wanted in expected(arc).items():
            text = got[name]
            same(f"{path}: row {i + 1}: {name}",
                 text if isinstance(wanted, str) else number(text), wanted)
        same(f"{path}: row {i + 1}: cell", got["cell"], arc["arc"]["cell"])
    only = [(row["finding"], row["cell"]) for row in read[len(arcs):]]
    wanted = [(f"only in {side}", row["arc"]["cell"])
              for side in "AB" for row in report[f"only_{side.lower()}"]]
    same(f"{path}: of one side", json.dumps(only), json.dumps(wanted))


def change_text(change):
    if change is None:
        return "–"
    text = percent(change["relative"])
    if change["expanded"] is None:
        return text
    # Rounded up, to the decimals that a percentage of its size is shown with.
    percents = 100 * change["expanded"]
    decimals = 1 if percents < 9.95 else 0
    steps = max(0, math.ceil(percents * 10 ** decimals - 1e-9))
    return f"{text} ±{steps / 10 ** decimals:.{decimals}f} %"


def measured_text(measured, decimals):
    if measured is None:
        return "–"
    return with_uncertainty(measured["value"], measured["u"], decimals)


def check_page(path, report):
    page = Page()
    page.feed(path.read_text(encoding="utf-8"))
    data, arcs = json.loads(page.data), report["arcs"]
    same(f"{path}: rows", len(page.rows), len(arcs))
    same(f"{path}: arcs", len(data["arcs"]), len(arcs))
    same(f"{path}: images", page.tags.count("img"), 0)
    for i, (cells, drawn, arc) in enumerate(
            zip(page.rows, data["arcs"], arcs)):
        where = f"{path}: arc {i + 1}"
        same(f"{where}: cell", data["cells"][drawn["c"]], arc["arc"]["cell"])
        same(f"{where}: name", drawn["n"], arc_text(arc))
        same(f"{where}: finding", drawn["f"], arc["finding"])
        e = expected(arc)
        wanted = []
        for figure, name, decimals in (("g", "effort", 3),
                                       ("p", "parasitic", 2)):
            for got, field in zip(drawn[figure],
                                  (f"{figure}_a", f"{figure}_b",
                                   f"{figure}_change",
                                   f"{figure}_change_expanded")):
                same(f"{where}: {field}", got, e[field], PAGE_DATA_ERROR)
            wanted += [measured_text(arc["a"][name], decimals),
                       measured_text(arc["b"][name], decimals),
                       change_text(arc[f"{name}_change"])]
        for j, text in enumerate(wanted):
            same(f"{where}: column {j + 4}",
                 cells[3 + j].strip().replace("\xa0", " "), text)


def main(folder):
    for json_path in sorted(folder.glob("*.json")):
        report = json.loads(json_path.read_text(encoding="utf-8"))
        check_changes(json_path, report["arcs"])
        check_spread(json_path, report)
        check_csv(json_path.with_suffix(".csv"), report)
        check_page(json_path.with_suffix(".html"), report)
        print(f"{json_path.stem}: {len(report['arcs'])} arcs, the same in "
              "three formats")


main(pathlib.Path(sys.argv[1]))
