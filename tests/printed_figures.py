"""Printed figures for the tests of the check, built from their digits."""

from __future__ import annotations

from typing import Any

from fourcount.record.entry.readings import PrintedFigure, PrintedNumber


def number(text: str) -> PrintedNumber:
    """A number with as many decimals as its text has."""
    return PrintedNumber(text=text, value=float(text), decimals=len(text.partition(".")[2]))


def printed(measure: Any, estimate: str = "", low: str = "", high: str = "", **rest: Any) -> PrintedFigure:
    """A figure from the texts of its numbers; an empty one is not printed. ``p`` is a text too."""
    if "p" in rest:
        rest["p"] = number(rest["p"])
    found = {name: number(text) for name, text in (("estimate", estimate), ("low", low), ("high", high)) if text}
    return PrintedFigure(measure=measure, text=f"{estimate} ({low} to {high})", **found, **rest)
