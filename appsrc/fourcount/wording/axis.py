"""The words at the ends of a drawn strip's scale."""

from __future__ import annotations

FRACTIONS = {2.0: "½", 4.0: "¼"}


def axis_words(kind: str, end: float) -> tuple[str, str, str]:
    """Words for the low end, no effect and the high end of a scale that reaches to ``end``."""
    if kind == "difference":
        reach = f"{100 * end:g}"
        return f"{reach} fewer", "0", f"{reach} more"
    if kind == "ratio":
        return f"{FRACTIONS.get(end, f'{1 / end:.2g}')} fewer", "1", f"more {end:g}"
    return "0", "", f"{100 * end:g}%"
