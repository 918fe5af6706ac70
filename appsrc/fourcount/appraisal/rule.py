"""A row of the table of cautions."""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass

from fourcount.appraisal.case import Case, Facts
from fourcount.record.outcome import FORMS, Form


@dataclass(frozen=True, kw_only=True, slots=True)
class Rule:
    """A caution: its key, when it holds, of which forms it is asked, and where it comes from.

    A rule answers with the facts for its sentence, with None, or with the facts of several sentences. One that is
    ``about_cells`` is asked even where the table gives no figure at all.
    """

    key: str
    holds: Callable[[Case], Facts | tuple[Facts, ...] | None]
    source: str
    forms: tuple[Form, ...] = tuple(FORMS)
    about_cells: bool = False
