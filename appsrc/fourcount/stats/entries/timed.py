"""The interval methods of two risks at one time, each printed with its limits. Zou and Donner: from memory."""

from __future__ import annotations

from fourcount.stats import timed
from fourcount.stats.entries.entry import Method

TIMED_METHODS = (
    Method(
        key="square-and-add",
        measure="timed_difference",
        interval=timed.square_and_add,
        title="Square-and-add of the printed limits",
        formula=(
            "Lower: D − √((p1−l1)² + (u2−p2)²); upper: D + √((u1−p1)² + (p2−l2)²); l, u are each risk’s printed limits"
        ),
        source="Newcombe 1998, Stat Med 17:873, method 10; Zou and Donner 2008, Stat Med 27:1693",
        note="At the level of the printed limits.",
    ),
    Method(
        key="square-and-add",
        measure="timed_ratio",
        interval=timed.square_and_add_ratio,
        title="Square-and-add of the printed limits, log scale",
        formula=(
            "Lower: R exp(−√(ln(p1/l1)² + ln(u2/p2)²)); upper: R exp(√(ln(u1/p1)² + ln(p2/l2)²)); "
            "l, u are each risk’s printed limits"
        ),
        source="Zou and Donner 2008, Stat Med 27:1693",
        note="At the level of the printed limits. Where a risk is 0, no interval is given.",
    ),
)
