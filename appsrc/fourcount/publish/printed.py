"""What a paper prints, held against its counts, as other programs and a terminal read it."""

from __future__ import annotations

from math import inf
from textwrap import fill

from fourcount.appraisal.check.digits import SCALES
from fourcount.appraisal.findings import CheckFindings, FigureCheck, Match
from fourcount.publish.plain_text import one_line
from fourcount.record.entry.readings import PrintedFigure
from fourcount.wording.check import CheckLine, cell_text, figure_lines
from fourcount.wording.gaps import mark_text
from fourcount.wording.printed_labels import CHECK_HEAD

Json = dict[str, object]

WIDTH = 79
BULLETS = {True: "  ", False: "- "}


def printed(found: CheckFindings) -> Json:
    """``printed``: every way in which a printed figure follows from the counts; ``check``: what is said of them.

    Of a match, ``says`` is what the print calls the figure and ``as`` what it is; ``computed`` are our figures, as
    fractions like all others here; a number needed and a ratio have no other scale. ``adjusted`` stands beside them
    where the interval rests on altered counts ("half" added).
    """
    return {
        "printed": [_match(figure.printed, match) for figure in found.figures for match in figure.matches],
        "check": [
            *({"key": mark.key, "text": mark_text(mark), "agrees": False} for mark in found.marks),
            *(line for figure in found.figures for line in _said(figure)),
            *({"key": finding.key, "text": cell_text(finding), "agrees": finding.agrees} for finding in found.cells),
        ],
        "adopt": None if found.adopt is None else {"intervals": found.adopt[0], "level": found.adopt[1]},
    }


def printed_listing(found: CheckFindings) -> str:
    """The sentences of a check for a terminal; a dash before those that ask for something to be looked at."""
    marks = [CheckLine(key=mark.key, text=f"{mark_text(mark)}.", agrees=False) for mark in found.marks]
    lines = [*marks, *(line for figure in found.figures for line in figure_lines(figure))]
    if not lines:
        return ""
    return "\n".join([CHECK_HEAD, *map(_wrapped, lines)]) + "\n\n"


def _match(figure: PrintedFigure, match: Match) -> Json:
    scale = SCALES[figure.unit]
    names = ("estimate", "low", "high")
    return {
        "says": figure.measure,
        "as": match.measure,
        "method": match.method or None,
        "level": match.level if match.method else None,
        "orientation": match.orientation,
        "fit": match.fit,
        "computed": {name: _value(number, scale) for name, number in zip(names, match.computed, strict=True)},
        "text": figure.text,
        **({"adjusted": match.adjusted} if match.adjusted else {}),
    }


def _value(number: float | None, scale: int) -> object:
    if number is None:
        return None
    return {inf: "inf", -inf: "-inf"}.get(number, number / scale)


def _said(figure: FigureCheck) -> list[Json]:
    lines = figure_lines(figure)
    return [{"key": line.key, "text": line.text, "agrees": line.agrees, "of": figure.printed.text} for line in lines]


def _wrapped(line: CheckLine) -> str:
    first = BULLETS[line.agrees]
    return fill(one_line(line.text), WIDTH, initial_indent=first, subsequent_indent="  ", break_on_hyphens=False)
