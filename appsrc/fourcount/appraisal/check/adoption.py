"""Under which of this record's choices its own figures are the paper's."""

from __future__ import annotations

from collections.abc import Iterable

from fourcount.appraisal.check.search import Hit, has_limits
from fourcount.appraisal.check.shown import is_shown, method_of
from fourcount.record.entry.readings import PrintedFigure
from fourcount.record.paper import HIGHEST_LEVEL, LOWEST_LEVEL, Choices, Family

Adopted = tuple[str, float]
_ORDER: tuple[Family, ...] = ("textbook", "score", "exact")  # papers usually print the textbook family


def adoption(found: Iterable[tuple[PrintedFigure, tuple[Hit, ...]]], choices: Choices) -> Adopted | None:
    """The family and level whose methods give all printed limits that any method gives as read; None where none does.

    The record's own family is kept where it does. Figures that are not reproduced as read decide nothing, except that
    at least one has to be. A hazard ratio decides nothing: no table gives one.
    """
    told = [_told(hits) for figure, hits in found if has_limits(figure) and figure.measure != "hazard_ratio"]
    told = [ways for ways in told if ways]
    levels = dict.fromkeys(level for ways in told for _, _, level in ways)
    families = dict.fromkeys((choices.family, *_ORDER))
    for level in sorted(levels, key=lambda level: level != choices.level):
        for family in families:
            if LOWEST_LEVEL <= level <= HIGHEST_LEVEL and all(_holds(ways, family, level) for ways in told):
                return family, level
    return None


def _told(hits: tuple[Hit, ...]) -> set[tuple[str, str, float]]:
    """Measure, method and level of each whole match of the best rank that the window shows as it stands."""
    return {
        (hit.candidate.measure, hit.match.method, hit.match.level)
        for hit in hits
        if hit.match.fit == "all" and hit.rank == hits[0].rank and is_shown(hit.candidate)
    }


def _holds(ways: set[tuple[str, str, float]], family: str, level: float) -> bool:
    return any(at == level and method == method_of(family, measure) for measure, method, at in ways)
