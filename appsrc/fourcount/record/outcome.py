"""One outcome of a paper: its table as printed, its words, and the patient it is carried to.

All text is kept exactly as typed; ``record.entry`` reads it. Positions are those of the print: the
*first* and *second* group, the *left* and *right* column. Which group is the index group and which
column is counted are choices beside the text, so that swapping either never moves what was typed. A starting
risk alone is turned to its complement with the counted column, whose risk it is.
"""

from __future__ import annotations

from typing import Literal

import msgspec

Design = Literal["trial", "cohort", "survey", "case-control", "matched", "paired", "before-after"]
Position = Literal["first", "second"]
Column = Literal["left", "right"]
Effect = Literal["usual", "risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference", "adjusted"]
StartKind = Literal["one", "three", "rate", "overall"]
LineKind = Literal["none", "matters", "margin"]
LineScale = Literal["risk_difference", "risk_ratio", "odds_ratio", "hazard_ratio"]
LineSide = Literal["fewer", "more"]
Certainty = Literal["", "high", "moderate", "low", "very-low"]
Layout = Literal["down", "across"]
PaperMeasure = Literal["risk_ratio", "odds_ratio", "hazard_ratio", "rate_ratio", "risk_difference", "rate_difference"]
Counting = Literal["people", "events"]
Where = Literal["", "abstract", "text", "table", "figure", "supplement"]

DESIGNS: tuple[Design, ...] = ("trial", "cohort", "survey", "case-control", "matched", "paired", "before-after")
PAIRED_DESIGNS: tuple[Design, ...] = ("matched", "paired", "before-after")
"""Designs whose people come in pairs: cases with their own controls, or the same people twice."""

PAPER_MEASURES: tuple[PaperMeasure, ...] = (
    "risk_ratio",
    "odds_ratio",
    "hazard_ratio",
    "rate_ratio",
    "risk_difference",
    "rate_difference",
)
EFFECTS: tuple[Effect, ...] = (
    "usual",
    "risk_ratio",
    "odds_ratio",
    "hazard_ratio",
    "rate_ratio",
    "risk_difference",
    "adjusted",
)
START_KINDS: tuple[StartKind, ...] = ("one", "three", "rate", "overall")
LINE_KINDS: tuple[LineKind, ...] = ("none", "matters", "margin")
LINE_SCALES: tuple[LineScale, ...] = ("risk_difference", "risk_ratio", "odds_ratio", "hazard_ratio")
LINE_SIDES: tuple[LineSide, ...] = ("fewer", "more")
CERTAINTIES: tuple[Certainty, ...] = ("", "high", "moderate", "low", "very-low")
WHERE: tuple[Where, ...] = ("", "abstract", "text", "table", "figure", "supplement")
CELLS = ("first_left_text", "first_right_text", "second_left_text", "second_right_text")


class Print(msgspec.Struct, frozen=True, forbid_unknown_fields=True, tag_field="form"):
    """What every form of print is: in a file it says its form, and holds nothing unknown."""


class EventsAndOthers(Print, frozen=True, kw_only=True, tag="events-and-others"):
    """The print ``38 · 374``: in each group, people with the left outcome and with the right one."""

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


class EventsOfTotal(Print, frozen=True, kw_only=True, tag="events-of-total"):
    """The print ``38 of 412``: in each group, people with the left outcome (left) and all people (right)."""

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


class PercentOfTotal(Print, frozen=True, kw_only=True, tag="percent-of-total"):
    """The print ``9.2% of 412``: in each group, the percentage with the left outcome (left) and all people (right)."""

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


class Pairs(Print, frozen=True, kw_only=True, tag="pairs"):
    """Counts of pairs: both sides had the left outcome, the first side only, the second side only, neither.

    They stand in the four cells in that order, as a two-by-two table of the first side (down) by the second (across)
    prints them. The two concordant counts may stay empty.
    """

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


class PersonTime(Print, frozen=True, kw_only=True, tag="person-time"):
    """The print ``38 in 4,120 person-years``: in each group, events (left) and person-time (right), in one unit."""

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""
    unit_text: str = ""


class RiskAtTime(Print, frozen=True, kw_only=True, tag="risk-at-time"):
    """The print ``9% (6 to 12) at 2 years``: in each group, a risk (left) and its limits (right).

    A left cell may hold the limits as well. The time is the outcome's time span; an empty level is 95%.
    """

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""
    limits_level_text: str = ""


class EffectOnly(Print, frozen=True, kw_only=True, tag="effect-only"):
    """The print ``OR 0.49 (0.32 to 0.75)`` without counts: the effect stands in the outcome's ``paper_text``.

    It is an adjusted one where ``adjusted_for_text`` says for what.
    """


class Stratum(msgspec.Struct, frozen=True, kw_only=True, forbid_unknown_fields=True):
    """One of several tables of one outcome, with its label ("under 65")."""

    label_text: str = ""
    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


class Strata(Print, frozen=True, kw_only=True, tag="strata"):
    """Several tables of one outcome, to be pooled; each row as ``38 · 374`` or, with ``of_total``, as ``38 of 412``."""

    strata: tuple[Stratum, ...] = (Stratum(), Stratum())
    of_total: bool = True


Table = EventsAndOthers | EventsOfTotal | PercentOfTotal | Pairs | PersonTime | RiskAtTime | EffectOnly | Strata

Form = Literal[
    "events-and-others",
    "events-of-total",
    "percent-of-total",
    "effect-only",
    "pairs",
    "person-time",
    "risk-at-time",
    "strata",
]
FORMS: dict[Form, type[Table]] = {
    "events-and-others": EventsAndOthers,
    "events-of-total": EventsOfTotal,
    "percent-of-total": PercentOfTotal,
    "effect-only": EffectOnly,
    "pairs": Pairs,
    "person-time": PersonTime,
    "risk-at-time": RiskAtTime,
    "strata": Strata,
}
"""Every form of print by its key, in the order in which the window offers them."""

COUNTED_FORMS: tuple[Form, ...] = ("events-and-others", "events-of-total", "percent-of-total")
"""The forms that give the four counts of one unpaired table."""


def form_of(table: Table) -> Form:
    """The key of a table's form."""
    return next(form for form, kind in FORMS.items() if type(table) is kind)


class Patient(msgspec.Struct, frozen=True, kw_only=True, forbid_unknown_fields=True):
    """Whom the effect is carried to.

    ``start_kind`` says how the starting risk is given: "one" risk (``starting_risk_text``, maybe with its own limits
    or as "24 of 200"; empty means the reference group's own), "three" (low, usual and high; the usual one is
    ``starting_risk_text``), a "rate" (``rate_text``, "12 per 1,000 person-years", over the time span in use), or
    solved from an "overall" risk and the share of people who have the exposure. The texts of the kinds not chosen stay.

    ``other_span_text`` is a time span other than the study's ("5 years"). ``effect`` "usual" is the risk ratio, outside
    trials the printed adjusted effect where there is one, else whatever the print gives.
    """

    starting_risk_text: str = ""
    starting_risk_source_text: str = ""
    effect: Effect = "usual"
    start_kind: StartKind = "one"
    low_risk_text: str = ""
    high_risk_text: str = ""
    rate_text: str = ""
    overall_risk_text: str = ""
    exposed_share_text: str = ""
    other_span_text: str = ""


class Outcome(msgspec.Struct, frozen=True, kw_only=True, forbid_unknown_fields=True):
    """One table of a paper and what it counts.

    ``left_heading_text`` and ``right_heading_text`` name the two outcomes in the grid ("fell", "did not
    fall"); ``left_words_text`` and ``right_words_text`` say them in full for sentences ("fell at least
    once"). ``left_welcome`` says whether the left outcome is a good one; the right one is its opposite.

    ``paper_text`` is what the paper itself prints as the result of these counts ("0.54 (0.37 to 0.78)"), of the
    measure ``paper_measure`` unless the text names another one. ``adjusted_text`` is an effect that the paper prints
    after adjustment for ``adjusted_for_text``. ``first_randomised_text`` and ``first_lost_text`` are people of the
    first group beside those in the table; ``first_loss_ratio_text`` says how many times the risk of those followed
    the lost ones have in the scenario of the reader's own. ``icc_text`` and ``cluster_size_text`` describe clusters.
    """

    name_text: str = ""
    table: Table = EventsAndOthers()
    design: Design = "trial"
    first_label_text: str = ""
    second_label_text: str = ""
    left_heading_text: str = ""
    right_heading_text: str = ""
    left_words_text: str = ""
    right_words_text: str = ""
    left_welcome: bool = False
    span_text: str = ""
    index_group: Position = "first"
    counted: Column = "left"
    layout: Layout = "down"
    patient: Patient = Patient()
    counting: Counting = "people"
    follow_up_varied: bool = False
    where: Where = ""
    paper_measure: PaperMeasure = "risk_ratio"
    paper_text: str = ""
    adjusted_measure: PaperMeasure = "odds_ratio"
    adjusted_text: str = ""
    adjusted_for_text: str = ""
    first_randomised_text: str = ""
    second_randomised_text: str = ""
    first_lost_text: str = ""
    second_lost_text: str = ""
    first_loss_ratio_text: str = ""
    second_loss_ratio_text: str = ""
    icc_text: str = ""
    cluster_size_text: str = ""
    line_kind: LineKind = "none"
    line_scale: LineScale = "risk_difference"
    line_side: LineSide = "fewer"
    line_text: str = ""
    plain_event_text: str = ""
    plain_other_text: str = ""
    certainty: Certainty = ""
    on_handout: bool = True

    @property
    def counts_left(self) -> bool:
        """Whether the left outcome is the one counted. Person-time has events alone, and they stand left."""
        return self.counted == "left" or isinstance(self.table, PersonTime)

    @property
    def welcome(self) -> bool:
        """Whether the counted outcome is a good one."""
        return self.left_welcome == self.counts_left

    @property
    def index_label_text(self) -> str:
        return self.first_label_text if self.index_group == "first" else self.second_label_text

    @property
    def reference_label_text(self) -> str:
        return self.second_label_text if self.index_group == "first" else self.first_label_text

    @property
    def event_heading_text(self) -> str:
        return self.left_heading_text if self.counts_left else self.right_heading_text

    @property
    def other_heading_text(self) -> str:
        return self.right_heading_text if self.counts_left else self.left_heading_text

    @property
    def event_words_text(self) -> str:
        return self.left_words_text if self.counts_left else self.right_words_text

    @property
    def other_words_text(self) -> str:
        return self.right_words_text if self.counts_left else self.left_words_text
