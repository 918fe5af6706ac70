"""A pasted block or sentence in, what it was understood as out: a dictionary, ready for strict JSON."""

from __future__ import annotations

from math import isfinite

from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.paste import read_paste
from fourcount.record.entry.readings import Count, Pasted, PastedGroup, PrintedFigure, PrintedNumber

Json = dict[str, object]

FORMAT = 1


def read(text: str) -> Json:
    """What a printed block or sentence says of two groups, with the results printed beside their counts.

    Parameters
    ----------
    text : str
        Cells out of a spreadsheet or a PDF, or a sentence such as "Falls occurred in 38 of 412 patients (9.2%) with
        night lights and 70 of 409 (17.1%) with usual care (relative risk, 0.54; 95% CI, 0.37 to 0.78)".

    Returns
    -------
    dict
        ``form`` is the form of print ("events-of-total", "events-and-others", "percent-of-total", "person-time",
        "risk-at-time", "pairs", "strata", "effect-only"), None where the text holds no table. ``groups`` are in the
        order of the print, two for each of ``strata``; each has its label, the text of both cells, and the counts
        that are told. ``printed`` are the results beside the counts, on the scale on which they are printed.
        ``ambiguous`` lists what may be understood otherwise.
    """
    if not isinstance(text, str):
        raise TypeError("the text to be read is a str")
    pasted = read_paste(text)
    if pasted is None:
        return {"format": FORMAT, "form": None, "groups": [], "printed": [], "ambiguous": []}
    return {
        "format": FORMAT,
        "form": pasted.form,
        "source": pasted.source,
        "layout": pasted.layout,
        "groups": [_group(group, pasted) for group in pasted.groups],
        "strata": list(pasted.stratum_labels),
        "headings": [pasted.left_heading, pasted.right_heading],
        "words": pasted.words,
        "unit": pasted.unit,
        "span": pasted.span,
        "limits_level": pasted.limits_level,
        "printed": [_figure(figure) for figure in pasted.figures],
        "printed_text": pasted.paper_text,
        "adjusted_for": pasted.adjusted_for,
        "ambiguous": list(pasted.ambiguous),
    }


def _group(group: PastedGroup, pasted: Pasted) -> Json:
    """One group: its label, its two cells as text, and the counts in them."""
    published: Json = {"label": group.label, "cells": [group.left_text, group.right_text]}
    left, right = (_count(text) for text in (group.left_text, group.right_text))
    if pasted.form == "pairs" or left is None:
        return published
    published["events"] = left
    of_total = pasted.form == "events-of-total" or (pasted.form == "strata" and pasted.strata_of_total)
    if right is not None and pasted.form != "person-time":
        total = right if of_total else left + right
        published.update(non_events=total - left, total=total)
    return published


def _count(text: str) -> int | None:
    reading = read_cell(text)
    return reading.value if isinstance(reading, Count) else None


def _figure(figure: PrintedFigure) -> Json:
    return {
        "says": figure.text,
        "measure": figure.measure,
        "estimate": _number(figure.estimate),
        "low": _number(figure.low),
        "high": _number(figure.high),
        "level": figure.level,
        "p": _number(figure.p),
        "p_relation": figure.p_relation,
        "unit": figure.unit,
        "adjusted": figure.adjusted,
    }


def _number(number: PrintedNumber | None) -> float | str | None:
    """A number, None where none is printed; an infinity as "inf"."""
    if number is None:
        return None
    return number.value if isfinite(number.value) else ("inf" if number.value > 0 else "-inf")
