"""What measures and methods are called in a check, and our digits beside the printed ones."""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.record.entry.readings import PrintedFigure, PrintedNumber
from fourcount.stats.entries.print_only import PRINT_METHODS, PRINT_TESTS
from fourcount.stats.methods import method, test
from fourcount.stats.results import Fact
from fourcount.wording import numbers

MEASURES = {
    "risk_ratio": "risk ratio",
    "odds_ratio": "odds ratio",
    "conditional_odds_ratio": "conditional odds ratio",
    "hazard_ratio": "hazard ratio",
    "rate_ratio": "rate ratio",
    "risk_difference": "risk difference",
    "rate_difference": "rate difference",
    "relative_reduction": "relative reduction",
    "relative_increase": "relative increase",
    "odds_reduction": "relative reduction of the odds",
    "number_needed": "number needed",
    "risk": "risk",
    "risk_index": "index group’s risk",
    "risk_reference": "reference group’s risk",
    "rate_index": "index group’s rate",
    "rate_reference": "reference group’s rate",
    "p": "p value",
    "pair_difference": "paired difference",
    "pair_ratio": "risk ratio of the pairs",
    "pair_odds_ratio": "odds ratio of the discordant pairs",
    "pooled_risk_difference": "pooled risk difference",
    "pooled_risk_ratio": "pooled risk ratio",
    "pooled_odds_ratio": "pooled odds ratio",
    "timed_difference": "risk difference",
    "timed_ratio": "risk ratio",
}
ANALYSES = {
    "unpaired_": "{measure} of people taken as unpaired",
    "unclustered_": "{measure} of people taken as if in no clusters",
    "crude_": "crude {measure} of all strata thrown together",
}
SIDES = {
    "groups-swapped": "with the groups swapped",
    "other-outcome": "of the other outcome",
    "both-swapped": "of the other outcome, with the groups swapped",
}
EITHER_SIDE = "with the groups swapped, or of the other outcome"
SYMMETRIC_MEASURES = ("odds_ratio", "risk_difference", "pair_odds_ratio", "pair_difference", "conditional_odds_ratio")
"""Measures that do not tell swapped groups from the other outcome."""

AND, OR, COMMA = " and ", " or ", ", "
VOWELS = "aeiou"

_TITLES: dict[tuple[str, str], str] = {(entry.measure, entry.key): entry.title for entry in PRINT_METHODS}
_TEST_TITLES = {entry.key: entry.title for entry in PRINT_TESTS}


def measure_name(key: str) -> str:
    """A measure inside a sentence; an analysis that does not belong to the table says which it is."""
    for prefix, told in ANALYSES.items():
        if key.startswith(prefix):
            return told.format(measure=MEASURES[key.removeprefix(prefix)])
    return MEASURES.get(key, key.replace("_", " "))


def with_article(name: str) -> str:
    """ "an odds ratio", "a risk ratio"."""
    return f"{'an' if name[0] in VOWELS else 'a'} {name}"


def side_name(orientation: str, measure: str) -> str:
    """From which side a measure is seen; empty where it is as read."""
    if orientation == "groups-swapped" and measure in SYMMETRIC_MEASURES:
        return EITHER_SIDE
    return SIDES.get(orientation, "")


def method_title(measure: str, key: str) -> str:
    """The title of a method, shown or known in print only."""
    return _TITLES.get((measure, key)) or method(measure, key).title


def method_list(measure: str, keys: str) -> str:
    """The titles of several methods, any of which would do."""
    return listed([method_title(measure, key) for key in keys.split()], OR)


def test_list(keys: str) -> str:
    """The titles of several tests, each of which gives the digits."""
    return listed([_TEST_TITLES.get(key) or test(key).title for key in keys.split()], AND)


test_list.__test__ = False  # type: ignore[attr-defined]  # pytest would collect a function of this name


def listed(parts: list[str], last: str) -> str:
    """ "A", "A or B", "A, B or C"."""
    return parts[0] if len(parts) == 1 else f"{COMMA.join(parts[:-1])}{last}{parts[-1]}"


def printed_text(figure: PrintedFigure) -> str:
    """The figure in the digits of the print, without its name: 0.54 (0.37 to 0.78)."""
    estimate = _as_printed(figure.estimate)
    if figure.low is None and figure.high is None:
        return f"{estimate}{unit(figure)}"
    limits = f"{_as_printed(figure.low)}{numbers.TO}{_as_printed(figure.high)}"
    return f"{estimate}{unit(figure)} ({limits})" if figure.estimate is not None else limits


def _as_printed(number: PrintedNumber | None) -> str:
    return "…" if number is None else numbers.fixed(number.value, number.decimals)


def unit(figure: PrintedFigure) -> str:
    """What stands behind a printed number that is no plain ratio."""
    if figure.unit == "percent":
        return " points" if figure.measure in ("risk_difference", "rate_difference") else "%"
    return " per 1,000" if figure.unit == "per-1000" else ""


def our_estimate(figure: PrintedFigure, facts: Mapping[str, Fact], name: str = "estimate") -> str:
    """Our estimate with one decimal more than the printed one has."""
    return f"{ours(facts.get(name), figure.estimate or figure.low)}{unit(figure)}"


def our_limits(figure: PrintedFigure, facts: Mapping[str, Fact]) -> str:
    """Our limits, each with one decimal more than its printed one has."""
    return f"{ours(facts.get('low'), figure.low)}{numbers.TO}{ours(facts.get('high'), figure.high)}"


def our_figure(figure: PrintedFigure, facts: Mapping[str, Fact]) -> str:
    """Our estimate and, where there are any, our limits."""
    estimate = our_estimate(figure, facts)
    return f"{estimate} ({our_limits(figure, facts)})" if "low" in facts else estimate


def ours(value: Fact | None, printed: PrintedNumber | None) -> str:
    """A number of ours beside a printed one."""
    if not isinstance(value, int | float):
        return "…"
    decimals = 2 if printed is None else printed.decimals
    return numbers.plain(value, decimals + 1)
