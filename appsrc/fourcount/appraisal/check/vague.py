"""A percentage whose own text does not say of what."""

from __future__ import annotations

import re

from fourcount.record.entry.readings import PrintedFigure

_CALLED_A_DIFFERENCE = re.compile(r"diff|absolute|point|\bpp\b|\bA?RD\b|\bARR\b", re.IGNORECASE)


def may_be_relative(figure: PrintedFigure) -> bool:
    """Whether a percentage taken for a difference may as well be a relative one: "46% (22 to 63)", "a reduction of"."""
    return (
        figure.measure == "risk_difference"
        and figure.unit == "percent"
        and not _CALLED_A_DIFFERENCE.search(figure.text)
    )
