"""What reading a piece of text can give: a value, a blank, or a reason why not."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.record.outcome import Form, Layout

Fact = str | int | float


class Blank(msgspec.Struct, frozen=True):
    """Nothing was typed."""


class Unreadable(msgspec.Struct, frozen=True, kw_only=True):
    """Text that gives no value. ``key`` names the reason, ``facts`` what a sentence about it needs.

    ``facts["text"]`` is always what was typed, cut to 40 characters.
    """

    key: str
    facts: dict[str, Fact] = {}


class Count(msgspec.Struct, frozen=True, kw_only=True):
    """A whole number of people, 0 to 10^9, with the total or the percentage typed in the same cell."""

    value: int
    total: int | None = None
    percent_text: str | None = None


class Proportion(msgspec.Struct, frozen=True, kw_only=True):
    """A risk as a fraction from 0 to 1."""

    value: float


TimeUnit = Literal["day", "week", "month", "year"]

DAYS_IN: dict[TimeUnit, float] = {"day": 1.0, "week": 7.0, "month": 365.25 / 12, "year": 365.25}
"""Lengths of the units of a time span; a year of 365.25 days is common practice."""


class Duration(msgspec.Struct, frozen=True, kw_only=True):
    """A time span as typed, "12 months" or "5 years"."""

    value: float
    unit: TimeUnit

    @property
    def years(self) -> float:
        """The span in years; months are twelfths of one."""
        if self.unit == "month":
            return self.value / 12
        return self.value * DAYS_IN[self.unit] / DAYS_IN["year"]


class RiskReading(msgspec.Struct, frozen=True, kw_only=True):
    """A risk of other people, with whatever tells how precise it is.

    ``low`` and ``high`` are limits typed with it, at ``level`` (95% where none is said); ``events`` of ``total`` are
    the counts it was typed as. All of them are None where it is a bare value.
    """

    value: float
    low: float | None = None
    high: float | None = None
    level: float = 0.95
    events: int | None = None
    total: int | None = None


class RateReading(msgspec.Struct, frozen=True, kw_only=True):
    """Events in one person over one unit of time: 12 per 1,000 person-years is 0.012 a year."""

    value: float
    unit: TimeUnit


class Mark(msgspec.Struct, frozen=True, kw_only=True):
    """A field that is marked on screen, why, and whether what it holds is still used."""

    field: str
    key: str
    facts: dict[str, Fact] = {}
    used: bool = False


class GroupCounts(msgspec.Struct, frozen=True, kw_only=True):
    """One group in the print's order: left outcome, right outcome, all. None where it is not known."""

    left: int | None = None
    right: int | None = None
    total: int | None = None


class TableReading(msgspec.Struct, frozen=True, kw_only=True):
    """A table's numbers as far as they can be read, and the marks of its cells."""

    first: GroupCounts
    second: GroupCounts
    marks: tuple[Mark, ...] = ()


class PairsReading(msgspec.Struct, frozen=True, kw_only=True):
    """Counts of pairs by the print's sides; None where one is not known."""

    both: int | None = None
    first_only: int | None = None
    second_only: int | None = None
    neither: int | None = None
    marks: tuple[Mark, ...] = ()


class GroupRate(msgspec.Struct, frozen=True, kw_only=True):
    """One group's events and person-time; None where one is not known."""

    events: int | None = None
    time: float | None = None


class PersonTimeReading(msgspec.Struct, frozen=True, kw_only=True):
    """Events and person-time of both groups in the print's order, and the unit as typed ("person-years")."""

    first: GroupRate
    second: GroupRate
    unit: str = ""
    marks: tuple[Mark, ...] = ()


class PrintedRisk(msgspec.Struct, frozen=True, kw_only=True):
    """A risk with its printed limits, all fractions from 0 to 1; None where one is not known."""

    risk: float | None = None
    low: float | None = None
    high: float | None = None


class RiskAtTimeReading(msgspec.Struct, frozen=True, kw_only=True):
    """Both groups' printed risks in the print's order, and the level of their limits as a fraction."""

    first: PrintedRisk
    second: PrintedRisk
    level: float = 0.95
    marks: tuple[Mark, ...] = ()


class StratumReading(msgspec.Struct, frozen=True, kw_only=True):
    """One stratum: its label, its counts as far as they can be read, and the marks of its cells.

    A mark's field is ``strata.3.first_left_text``, with the stratum's place counted from 0.
    """

    label: str
    first: GroupCounts
    second: GroupCounts
    marks: tuple[Mark, ...] = ()

    @property
    def blank(self) -> bool:
        """Whether nothing was typed in this row's cells."""
        return self.first == GroupCounts() and self.second == GroupCounts() and not self.marks


class PrintedNumber(msgspec.Struct, frozen=True, kw_only=True):
    """A number as printed: its digits, how many decimals they have, its value (a percentage stays one)."""

    text: str
    value: float
    decimals: int


PrintedMeasure = Literal[
    "risk_ratio",
    "odds_ratio",
    "hazard_ratio",
    "rate_ratio",
    "risk_difference",
    "rate_difference",
    "relative_reduction",
    "number_needed",
    "risk",
    "p",
]
PrintedUnit = Literal["one", "percent", "per-1000"]
"""Whether a printed difference, reduction or risk is a fraction, a percentage (points), or so many per 1,000."""


class PrintedFigure(msgspec.Struct, frozen=True, kw_only=True):
    """One result as a paper prints it: what it calls it, estimate, limits, level and p, as far as they are there.

    ``level`` is the printed level as a fraction, None where none is printed. ``p`` stands behind ``p_relation``
    ("=", "<" or ">"). ``adjusted`` says that the print itself calls the figure adjusted. ``text`` is the piece that
    was read.
    """

    measure: PrintedMeasure
    text: str
    estimate: PrintedNumber | None = None
    low: PrintedNumber | None = None
    high: PrintedNumber | None = None
    level: float | None = None
    p: PrintedNumber | None = None
    p_relation: Literal["=", "<", ">"] = "="
    unit: PrintedUnit = "one"
    adjusted: bool = False


class PaperReading(msgspec.Struct, frozen=True, kw_only=True):
    """All figures that a printed text holds, and a mark for what could not be read in it."""

    figures: tuple[PrintedFigure, ...] = ()
    marks: tuple[Mark, ...] = ()


class PastedGroup(msgspec.Struct, frozen=True, kw_only=True):
    """One group of a paste as the text for its two cells, and its label where one was told."""

    left_text: str
    right_text: str
    label: str = ""


class Pasted(msgspec.Struct, frozen=True, kw_only=True):
    """What a pasted block or sentence was understood as.

    ``form`` is the form of print; ``groups`` are its two rows (several pairs of rows for strata) as cell text.
    ``left_heading`` and ``right_heading`` are headings told by a block; ``words`` says the event in full where a
    sentence told it; ``unit`` is that of person-time. ``figures`` are printed results beside the counts,
    ``paper_text`` the piece of text that holds them, and ``adjusted_for`` what an adjusted one was adjusted for.
    ``ambiguous`` lists by key what might be understood otherwise; a window shows what was understood before it is taken
    where anything is listed. ``limits_level`` is the level printed with limits of risks ("90%"). ``strata_of_total``
    says that the right cells of strata are totals. ``source`` is "block" or "sentence".
    """

    form: Form
    groups: tuple[PastedGroup, ...] = ()
    stratum_labels: tuple[str, ...] = ()
    left_heading: str = ""
    right_heading: str = ""
    words: str = ""
    unit: str = ""
    span: str = ""
    layout: Layout = "down"
    figures: tuple[PrintedFigure, ...] = ()
    paper_text: str = ""
    adjusted_for: str = ""
    ambiguous: tuple[str, ...] = ()
    limits_level: str = ""
    strata_of_total: bool = True
    source: Literal["block", "sentence"] = "block"
