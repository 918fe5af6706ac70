"""What the window shows beside a check: by which method, at which level, by which test."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Literal, cast

from fourcount.appraisal.check.candidate import Candidate, Way
from fourcount.appraisal.check.search import OTHER_ANALYSES
from fourcount.stats.methods import FAMILIES, PAIR_FAMILIES, RATE_FAMILIES

Given = Literal["counts", "strata", "pairs", "person-time", "risks"]
"""What a table hands over."""

_ALIKE = {
    "pooled_risk_difference": "sato",
    "pooled_risk_ratio": "greenland-robins",
    "pooled_odds_ratio": "robins-breslow-greenland",
    "timed_difference": "square-and-add",
    "timed_ratio": "square-and-add",
}


@dataclass(frozen=True, kw_only=True, slots=True)
class Shown:
    """The family and the level that the record shows; no family where the window withholds intervals."""

    family: str = ""
    level: float = 0.95

    def way(self, candidate: Candidate, level: float) -> Way | None:
        """The method by which the window shows a candidate at this level; None where it shows no such figure."""
        if not self.family or abs(level - self.level) > 1e-12 or not is_shown(candidate):
            return None
        key = method_of(self.family, candidate.measure)
        return next((way for way in candidate.ways if way.key == key), None)

    def test(self, given: Given) -> str:
        """The test that the window shows."""
        if not self.family or given == "risks":
            return ""
        if given == "strata":
            return "cmh"
        families = {"pairs": PAIR_FAMILIES, "person-time": RATE_FAMILIES}.get(given, FAMILIES)
        return cast("str", getattr(families[self.family], "test", ""))  # type: ignore[index]


def is_shown(candidate: Candidate) -> bool:
    """Whether the window shows this very estimate: not a conditional one, nor turned, nor of an analysis it refuses."""
    return candidate.as_printed and not candidate.heavy and not candidate.key.startswith(OTHER_ANALYSES)


def method_of(family: str, measure: str) -> str | None:
    """The method by which a family gives a measure; all families pool strata and join printed limits alike."""
    if measure.startswith("pair_"):
        return cast("str | None", getattr(PAIR_FAMILIES[family], measure.removeprefix("pair_"), None))
    if measure.startswith("rate"):
        return cast("str | None", getattr(RATE_FAMILIES[family], measure.removeprefix("rate_"), None))
    return _ALIKE.get(measure) or cast("str | None", getattr(FAMILIES[family], measure, None))
