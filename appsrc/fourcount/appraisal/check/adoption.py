"""Under which of this record's choices its own figures are the paper's."""

from __future__ import annotations

from collections.abc import Iterable
from typing import cast

from fourcount.appraisal.check.search import OTHER_ANALYSES, Hit, has_limits
from fourcount.record.entry.readings import PrintedFigure
from fourcount.record.paper import HIGHEST_LEVEL, LOWEST_LEVEL, Choices, Family
from fourcount.stats.methods import FAMILIES, PAIR_FAMILIES, RATE_FAMILIES

Adopted = tuple[str, float]
_ORDER: tuple[Family, ...] = ("textbook", "score", "exact")  # papers usually print the textbook family

_ALIKE = {
    "pooled_risk_difference": "sato",
    "pooled_risk_ratio": "greenland-robins",
    "pooled_odds_ratio": "robins-breslow-greenland",
    "timed_difference": "square-and-add",
    "timed_ratio": "square-and-add",
}


def adoption(found: Iterable[tuple[PrintedFigure, tuple[Hit, ...]]], choices: Choices) -> Adopted | None:
    """The family and level whose methods give all printed limits that any method gives as read; None where none does.

    The record's own family is kept where it does. Figures that are not reproduced as read decide nothing, except that
    at least one has to be.
    """
    told = [_told(hits) for figure, hits in found if has_limits(figure)]
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
        if hit.match.fit == "all"
        and hit.rank == hits[0].rank
        and hit.candidate.orientation == "as-read"
        and _shown(hit)
    }


def _shown(hit: Hit) -> bool:
    """Whether the window shows this very estimate: not a conditional one, nor turned, nor of an analysis it refuses."""
    if hit.candidate.orientation != "as-read":
        return False
    return not hit.candidate.heavy and not hit.candidate.key.startswith(OTHER_ANALYSES)


def _holds(ways: set[tuple[str, str, float]], family: str, level: float) -> bool:
    return any(at == level and method == method_of(family, measure) for measure, method, at in ways)


def method_of(family: str, measure: str) -> str | None:
    """The method by which a family gives a measure; all families pool strata and join printed limits alike."""
    if measure.startswith("pair_"):
        return cast("str | None", getattr(PAIR_FAMILIES[family], measure.removeprefix("pair_"), None))
    if measure.startswith("rate"):
        return cast("str | None", getattr(RATE_FAMILIES[family], measure.removeprefix("rate_"), None))
    return _ALIKE.get(measure) or cast("str | None", getattr(FAMILIES[family], measure, None))
