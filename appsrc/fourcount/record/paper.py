"""A paper's record: its outcomes, and the choices that hold for all of them."""

from __future__ import annotations

from typing import Literal

import msgspec

from fourcount.record.outcome import Outcome

Family = Literal["score", "textbook", "exact"]

FAMILIES: tuple[Family, ...] = ("score", "textbook", "exact")
LOWEST_LEVEL = 0.80
HIGHEST_LEVEL = 0.999
USUAL_LEVEL = 0.95  # of printed limits that say none: common practice


class Choices(msgspec.Struct, frozen=True, kw_only=True, forbid_unknown_fields=True):
    """How intervals are computed: the family, and the confidence level as a fraction (0.80 to 0.999)."""

    family: Family = "score"
    level: float = 0.95


class Record(msgspec.Struct, frozen=True, kw_only=True, forbid_unknown_fields=True):
    """What the reader typed and chose for one paper."""

    title_text: str = ""
    source_text: str = ""
    outcomes: tuple[Outcome, ...] = (Outcome(),)
    choices: Choices = Choices()
