"""One printed result while it is read."""

from __future__ import annotations

from fourcount.record.entry.figure_names import Name
from fourcount.record.entry.p_values import Relation
from fourcount.record.entry.readings import PrintedMeasure, PrintedNumber, PrintedUnit
from fourcount.record.outcome import PaperMeasure


class Figure:
    """One result while it is read: places of its tokens and what was found between them."""

    def __init__(self, first: int, name: Name | None) -> None:
        self.first = first
        self.after = first
        self.name = name
        self.estimate: PrintedNumber | None = None
        self.low: PrintedNumber | None = None
        self.high: PrintedNumber | None = None
        self.level: float | None = None
        self.p: PrintedNumber | None = None
        self.p_relation: Relation = "="
        self.unit: PrintedUnit = "one"
        self.one_limit = ""
        self.start = first

    @property
    def named(self) -> bool:
        return self.name is not None

    @property
    def adjusted(self) -> bool:
        return self.name is not None and self.name.adjusted

    @property
    def bare(self) -> bool:
        """Whether it is a number alone, which is a result only where nothing stands before it."""
        alone = self.name is None and self.low is None and self.p is None and self.unit == "one"
        return alone and self.estimate is not None and self.estimate.value >= 0

    def measure_or(self, usual: PaperMeasure) -> PrintedMeasure | None:
        """What the figure is of, if one without a name is of ``usual``; None for what no count gives."""
        if self.estimate is None:
            return "p"
        percent = self.unit == "percent"
        if self.name is None:
            if self.unit == "per-1000":
                return usual if usual.endswith("difference") else "risk_difference"
            if not percent or usual.endswith("difference"):
                return usual
            return "risk_difference" if self.estimate.value < 0 or self.low else "risk"
        if self.name.vague and not (percent or self.unit == "per-1000" or usual.endswith("difference")):
            return None
        return self.name.measure
