"""formats_agree.py FOLDER: reads the five formats of each run back, with
Python's own parsers, and finds the same numbers in all of them.

JSON has every digit and is what the others are held against. CSV and JUnit
have every digit too; the page's data has nine; the page's table and Markdown
have what a reader is shown.
"""

import csv
import datetime
import fnmatch
import html.parser
import json
import math
import pathlib
import re
import sys
import xml.etree.ElementTree

TODAY = datetime.date.today().isoformat()

# Nine digits, rounded.
PAGE_DATA_ERROR = 0.6e-8


class Page(html.parser.HTMLParser):
    """The data element, the rows of the tables of arcs and of exemptions, and
    every tag seen."""

    def __init__(self):
        super().__init__()
        self.data, self.rows, self.exemptions, self.tags = "", [], [], []
        self.in_data = self.in_body = False
        self.table = None  # The rows that what follows belongs to.

    def handle_starttag(self, tag, attributes):
        attributes = dict(attributes)
        self.tags.append(tag)
        if tag == "script":
            self.in_data = attributes.get("id") == "data"
        elif tag == "table":
            self.table = (
                self.rows if attributes.get("id") == "arc-table" else
                self.exemptions if attributes.get("class") == "exemptions"
                else None)
        elif tag == "tbody":
            self.in_body = self.table is not None
        elif self.in_body and tag == "tr":
            self.table.append([])
        elif self.in_body and tag in ("td", "th"):
            self.table[-1].append("")

    def handle_endtag(self, tag):
        if tag == "script":
            self.in_data = False
        elif tag in ("table", "tbody"):
            self.in_body = False

    def handle_data(self, text):
        if self.in_data:
            self.data += text
        elif self.in_body and self.table and self.table[-1]:
            self.table[-1][-1] += text


def same(what, a, b, error=0.0):
    if a is None or b is None:
        good = a is b
    elif isinstance(a, str) or isinstance(b, str):
        good = a == b
    else:
        good = math.isclose(a, b, rel_tol=error, abs_tol=0.0) or a == b
    if not good:
        raise SystemExit(f"formats_agree: {what}: {a!r} is not {b!r}")


def number(text):
    return float(text) if text else None


def expected(row):
    """A comparison of the JSON report under the CSV report's names."""
    line = row["line"] is not None
    value = lambda field: row[field]["value"] if line else None
    u = lambda field: row[field]["u"] if line else None
    return {
        "g_hand": row["estimate"]["effort"],
        "g": value("effort"),
        "g_u": u("effort"),
        "g_difference": row["effort_difference"],
        "p_hand_nodes": row["estimate"]["parasitic_by_nodes"],
        "p_hand_tau": row["hand_parasitic"] if line else None,
        "p": value("parasitic"),
        "p_u": u("parasitic"),
        "p_difference": row["parasitic_difference"],
    }


def covers(exemption, row):
    arc = row["arc"]
    names = {"cells": arc["cell"], "pins": arc["pin"],
             "outputs": arc["output"], "corners": row["corner"]}
    return (all(fnmatch.fnmatchcase(name, exemption.get(key, "*"))
                for key, name in names.items()) and
            exemption.get("edge", arc["edge"]) == arc["edge"])


def troubles(row):
    """What is wrong with an arc: quantities, None for the arc as a whole."""
    if row["verdict"] == "within":
        return []
    found = []
    for quantity in ("effort", "parasitic"):
        u = row[f"{quantity}_difference_expanded"]
        if row["line"] is None or u is None:
            return [None]
        allowed = row["tolerance"][quantity]
        if abs(row[f"{quantity}_difference"]) - u > allowed or u > allowed:
            found.append(quantity)
    return found or [None]


def excuses(row, exemptions):
    """By trouble, the exemption that is in force, and the one that expired."""
    for trouble in troubles(row):
        fit = [e for e in exemptions if covers(e, row) and
               e.get("quantity", trouble) == trouble]
        now = [e for e in fit if e["expires"] >= TODAY]
        before = [] if now else fit
        yield trouble, (now or [None])[0], (before or [None])[0]


def is_excused(row, exemptions):
    found = list(excuses(row, exemptions))
    return bool(found) and all(now for _, now, _ in found)


def note(row, exemptions):
    """What every report says at the arc."""
    symbols = {"effort": "g", "parasitic": "p"}
    parts = []
    for place, verb in ((1, "exempt"), (2, "was exempt")):
        for exemption in exemptions:
            told = [found[0] for found in excuses(row, exemptions)
                    if found[place] is exemption]
            if told:
                of = ", ".join(symbols[q] for q in told if q)
                parts.append(f"{of}{' ' if of else ''}{verb} until "
                             f"{exemption['expires']}: {exemption['reason']} "
                             f"({exemption['author']})")
    return "; ".join(parts)


def code_span(text):
    inside = "".join("\\|" if c == "|" else " " if ord(c) < 32 else c
                     for c in text)
    longest = max([len(run) for run in re.findall("`+", text)], default=0)
    fence, pad = "`" * (longest + 1), " " if longest else ""
    return f"{fence}{pad}{inside}{pad}{fence}"


def arc_text(row):
    arc = row["arc"]
    return f"{arc['pin']}->{arc['output']} {arc['edge']}"


def check_csv(path, rows, exemptions):
    with open(path, newline="", encoding="utf-8") as file:
        read = list(csv.DictReader(file, strict=True))
    same(f"{path}: rows", len(read), len(rows))
    for i, (got, row) in enumerate(zip(read, rows)):
        where = f"{path}: row {i + 1}"
        for name, value in expected(row).items():
            same(f"{where}: {name}", number(got[name]), value)
        same(f"{where}: cell", got["cell"], row["arc"]["cell"])
        same(f"{where}: verdict", got["verdict"], row["verdict"])
        same(f"{where}: reason", got["reason"], row["reason"])
        same(f"{where}: excused", got["excused"],
             "yes" if is_excused(row, exemptions) else "no")
        same(f"{where}: exemption", got["exemption"], note(row, exemptions))


def check_junit(path, rows, exemptions):
    root = xml.etree.ElementTree.parse(path).getroot()
    cases = root.findall("./testsuite/testcase")
    same(f"{path}: cases", len(cases), len(rows))
    counts = {"failure": 0, "error": 0, "skipped": 0}
    for i, (case, row) in enumerate(zip(cases, rows)):
        where = f"{path}: case {i + 1}"
        got = {p.get("name"): p.get("value") for p in case.iter("property")}
        for name, value in expected(row).items():
            same(f"{where}: {name}", number(got.get(name)), value)
        cell = f"{row['corner']}.{row['arc']['cell']}"
        same(f"{where}: class", case.get("classname"), cell)
        wanted = {"within": None, "beyond": "failure",
                  "not measured": "error"}[row["verdict"]]
        wanted = "skipped" if is_excused(row, exemptions) else wanted
        for kind in counts:
            found = case.find(kind)
            same(f"{where}: {kind}", found is not None, wanted == kind)
            if found is not None:
                counts[kind] += 1
                same(f"{where}: reason", found.get("message"),
                     note(row, exemptions) if kind == "skipped" else
                     row["reason"])
    same(f"{path}: failures", int(root.get("failures")), counts["failure"])
    same(f"{path}: errors", int(root.get("errors")), counts["error"])
    same(f"{path}: skipped", int(root.get("skipped")), counts["skipped"])


def percent(ratio):
    value = 100 * ratio
    return f"{value:+.1f} %" if abs(value) < 9.95 else f"{value:+.0f} %"


def with_uncertainty(value, u, decimals):
    text = f"{value:.{decimals}f}"
    return text if u is None else f"{text} ±{u:.{decimals}f}"


def shown(row, none):
    """What a reader is shown of g and p, from the JSON report's digits."""
    e = expected(row)
    hand = row["hand_parasitic"]
    texts = [f"{e['g_hand']:.3f}", none, none,
             f"{hand:.2f}" if hand > 0 else none, none, none]
    if e["g"] is not None:
        texts[1] = with_uncertainty(e["g"], e["g_u"], 3)
        texts[2] = percent(e["g_difference"])
        texts[4] = with_uncertainty(e["p"], e["p_u"], 2)
        texts[5] = percent(e["p_difference"])
    return texts


def check_markdown(path, rows, exemptions):
    text = path.read_text(encoding="utf-8")
    folded = text[text.index("<details><summary>"):text.rindex("</details>")]
    # The head, its rule, then one line an arc; a | of a name has a backslash.
    lines = [l for l in folded.split("\n") if l.startswith("| ")][1:]
    same(f"{path}: rows", len(lines), len(rows))
    for i, (line, row) in enumerate(zip(lines, rows)):
        cells = [c.strip() for c in re.split(r"(?<!\\)\|", line)[1:-1]]
        same(f"{path}: columns of row {i + 1}", len(cells), 10)
        for j, text in enumerate(shown(row, "-")):
            same(f"{path}: row {i + 1}, column {j + 4}", cells[3 + j], text)
        verdict = row["verdict"] + (", bent" if row["bent"] else "")
        if note(row, exemptions):
            verdict += ", " + code_span(note(row, exemptions))
        same(f"{path}: verdict of row {i + 1}", cells[9], verdict)


def check_page_data(path, data, rows):
    same(f"{path}: arcs", len(data["arcs"]), len(rows))
    for i, (arc, row) in enumerate(zip(data["arcs"], rows)):
        where = f"{path}: arc {i + 1}"
        same(f"{where}: cell", data["cells"][arc["c"]], row["arc"]["cell"])
        same(f"{where}: corner", data["corners"][arc["k"]], row["corner"])
        same(f"{where}: name", arc["n"], arc_text(row))
        same(f"{where}: verdict", arc["v"], row["verdict"])
        e = expected(row)
        same(f"{where}: hand g", arc["g"][0], e["g_hand"], PAGE_DATA_ERROR)
        same(f"{where}: hand p", arc["p"][0], row["hand_parasitic"],
             PAGE_DATA_ERROR)
        for figure in ("g", "p"):
            for place, name in ((1, figure), (2, f"{figure}_u"),
                                (3, f"{figure}_difference")):
                same(f"{where}: {name}", arc[figure][place], e[name],
                     PAGE_DATA_ERROR)
        same(f"{where}: points", len(arc["x"]), len(row["points"]))
        for got, point in zip(arc["x"], row["points"]):
            same(f"{where}: fanout", got[0], point["fanout"], PAGE_DATA_ERROR)
            same(f"{where}: delay", got[1], 1e12 * point["delay_s"],
                 PAGE_DATA_ERROR)


def check_page(path, rows, exemptions):
    page = Page()
    page.feed(path.read_text(encoding="utf-8"))
    check_page_data(path, json.loads(page.data), rows)
    same(f"{path}: rows", len(page.rows), len(rows))
    same(f"{path}: images", page.tags.count("img"), 0)
    same(f"{path}: scripts", page.tags.count("script"), 3)
    for i, (cells, row) in enumerate(zip(page.rows, rows)):
        same(f"{path}: columns of row {i + 1}", len(cells), 10)
        same(f"{path}: cell of row {i + 1}", cells[0].strip(),
             row["arc"]["cell"].strip())
        for j, text in enumerate(shown(row, "–")):
            same(f"{path}: row {i + 1}, column {j + 4}", cells[3 + j].strip(),
                 text)
        if not cells[9].startswith(row["verdict"]):
            raise SystemExit(f"formats_agree: {path}: row {i + 1}: "
                             f"{cells[9]!r} is not {row['verdict']!r}")
        told = cells[9].replace("\u00a0", " ").strip()
        if not told.endswith(note(row, exemptions)):
            raise SystemExit(f"formats_agree: {path}: row {i + 1}: "
                             f"{told!r} does not end with "
                             f"{note(row, exemptions)!r}")
    same(f"{path}: exemptions", len(page.exemptions), len(exemptions))
    for cells, exemption in zip(page.exemptions, exemptions):
        for place, field in ((3, "expires"), (4, "reason"), (5, "author")):
            same(f"{path}: {field}", cells[place], exemption[field])
        same(f"{path}: expired", cells[2] == "expired",
             exemption["expires"] < TODAY)


def main(folder):
    for json_path in sorted(folder.glob("*.json")):
        run = json.loads(json_path.read_text(encoding="utf-8"))
        rows, exemptions = run["comparisons"], run["facts"]["exemptions"]
        for check, suffix in ((check_csv, ".csv"), (check_junit, ".xml"),
                              (check_markdown, ".md"), (check_page, ".html")):
            check(json_path.with_suffix(suffix), rows, exemptions)
        print(f"{json_path.stem}: {len(rows)} arcs, the same in five formats")


if __name__ == "__main__":
    main(pathlib.Path(sys.argv[1]))
