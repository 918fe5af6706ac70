"""One outcome of a paper: its table as printed, its words, and the patient it is carried to.

All text is kept exactly as typed; ``record.entry`` reads it. Positions are those of the print: the
*first* and *second* group, the *left* and *right* column. Which group is the index group and which
column is counted are choices beside the text, so that swapping either never moves what was typed. A starting
risk alone is turned to its complement with the counted column, whose risk it is.
"""

from __future__ import annotations

from typing import Literal

import msgspec

Design = Literal["trial", "cohort", "survey", "case-control"]
Position = Literal["first", "second"]
Column = Literal["left", "right"]
Effect = Literal["risk_ratio", "odds_ratio"]
Layout = Literal["down", "across"]

DESIGNS: tuple[Design, ...] = ("trial", "cohort", "survey", "case-control")
CELLS = ("first_left_text", "first_right_text", "second_left_text", "second_right_text")


class EventsAndOthers(msgspec.Struct, frozen=True, kw_only=True, tag="events-and-others"):
    """The print ``38 · 374``: in each group, people with the left outcome and with the right one."""

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


class EventsOfTotal(msgspec.Struct, frozen=True, kw_only=True, tag="events-of-total"):
    """The print ``38 of 412``: in each group, people with the left outcome (left) and all people (right)."""

    first_left_text: str = ""
    first_right_text: str = ""
    second_left_text: str = ""
    second_right_text: str = ""


Table = EventsAndOthers | EventsOfTotal


class Patient(msgspec.Struct, frozen=True, kw_only=True):
    """Whom the effect is carried to. An empty starting risk means the reference group's own."""

    starting_risk_text: str = ""
    starting_risk_source_text: str = ""
    effect: Effect = "risk_ratio"


class Outcome(msgspec.Struct, frozen=True, kw_only=True):
    """One table of a paper and what it counts.

    ``left_heading_text`` and ``right_heading_text`` name the two outcomes in the grid ("fell", "did not
    fall"); ``left_words_text`` and ``right_words_text`` say them in full for sentences ("fell at least
    once"). ``left_welcome`` says whether the left outcome is a good one; the right one is its opposite.
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

    @property
    def welcome(self) -> bool:
        """Whether the counted outcome is a good one."""
        return self.left_welcome == (self.counted == "left")

    @property
    def index_label_text(self) -> str:
        return self.first_label_text if self.index_group == "first" else self.second_label_text

    @property
    def reference_label_text(self) -> str:
        return self.second_label_text if self.index_group == "first" else self.first_label_text

    @property
    def event_heading_text(self) -> str:
        return self.left_heading_text if self.counted == "left" else self.right_heading_text

    @property
    def other_heading_text(self) -> str:
        return self.right_heading_text if self.counted == "left" else self.left_heading_text

    @property
    def event_words_text(self) -> str:
        return self.left_words_text if self.counted == "left" else self.right_words_text

    @property
    def other_words_text(self) -> str:
        return self.right_words_text if self.counted == "left" else self.left_words_text
