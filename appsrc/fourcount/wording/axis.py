"""The words at the ends of a drawn strip's scale, and at no effect."""

from __future__ import annotations

from fourcount.wording import numbers

RATIO_ENDS = {2.0: "½", 4.0: "¼", 10.0: "0.1", 50.0: "0.02", 100.0: "0.01"}
"""How the low end of a scale of ratios is written, by its high end."""


def axis_words(kind: str, end: float) -> tuple[str, str, str]:
    """Words for the low end, no effect and the high end of a scale that reaches to ``end``."""
    if kind == "difference":
        reach = numbers.percent_given(end).rstrip("%")
        return f"{reach} fewer", "0", f"{reach} more"
    if kind == "ratio":
        return RATIO_ENDS[end], "lower | higher", numbers.whole(int(end))
    if kind == "rate_difference":
        return f"{numbers.quantity(end)} fewer", "0", f"{numbers.quantity(end)} more"
    if kind == "rate":
        return "0", "", numbers.quantity(end)
    return "0", "", numbers.percent_given(end)
