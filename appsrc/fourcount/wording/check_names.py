"""What measures and methods are called in a check, and our digits beside the printed ones."""

from __future__ import annotations

import math
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
UNCLUSTERED = "unclustered_"
ANALYSES = {
    "unpaired_": "{measure} of people taken as unpaired",
    UNCLUSTERED: "{measure} if the clusters are left out of account",
    "crude_": "crude {measure} of all strata thrown together",
}
SIDES = {
    "groups-swapped": "with the groups swapped",
    "other-outcome": "of the other outcome",
    "both-swapped": "of the other outcome, with the groups swapped",
}
EITHER_SIDE = "with the groups swapped, or of the other outcome"
SIGN_TURNED = "with its sign turned"
SYMMETRIC_MEASURES = ("odds_ratio", "pair_odds_ratio", "conditional_odds_ratio")
"""Measures that do not tell swapped groups from the other outcome."""

GIVEN = {"pairs": "the pairs", "person-time": "the events and person-time", "risks": "the two printed risks"}
COUNTS = "the counts"
"""What a table hands over to follow from."""
NO_NAMES = frozenset({"Binomial", "Conditional", "Likelihood", "Log", "Logit", "Score", "Square-and-add", "Test-based"})
"""First words of titles that are nobody's name, and stand in lower case inside a sentence."""
INSIDE = {
    ("pair_ratio", "log"): "the log method for pairs",
    ("pair_odds_ratio", "log"): "the log method for discordant pairs",
    ("rate_ratio", "log"): "the log method for rates",
    ("rate", "score"): "the score method for a count",
    ("risk", "logit"): "the logit method",
    ("risk_ratio", "test-based"): "test-based limits",
    ("odds_ratio", "test-based"): "test-based limits",
    ("timed_difference", "square-and-add"): "joining the printed limits",
    ("timed_ratio", "square-and-add"): "joining the printed limits",
}
"""Methods whose titles read badly behind "by"."""
HALF_ADDED = "{title} (1/2 added, since a count is 0)"
METHODS_KIND, TESTS_KIND = ("method", "methods"), ("test", "tests")
OTHERS = "{number} other {kind}"
MOST_NAMED = 2
HUGE = 1e9
ONE_POINT = ("1 points", f"{numbers.MINUS}1 points")
LOWER, UPPER = "lower limit {limit}", "upper limit {limit}"

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
    if orientation == "groups-swapped" and measure.endswith("difference"):
        return SIGN_TURNED
    if orientation == "groups-swapped" and measure in SYMMETRIC_MEASURES:
        return EITHER_SIDE
    return SIDES.get(orientation, "")


def method_title(measure: str, key: str) -> str:
    """The title of a method, shown or known in print only."""
    return _TITLES.get((measure, key)) or method(measure, key).title


def method_names(measure: str, keys: str, halved: str = "") -> list[str]:
    """Several methods inside a sentence; ``halved`` is the one that stands in for another where a count is 0."""
    return [
        HALF_ADDED.format(title=title) if key == halved else title
        for key in keys.split()
        for title in (INSIDE.get((measure, key)) or inside(method_title(measure, key)),)
    ]


def test_names(keys: str) -> list[str]:
    """Several tests inside a sentence."""
    return [inside(_TEST_TITLES.get(key) or test(key).title) for key in keys.split()]


test_names.__test__ = False  # type: ignore[attr-defined]  # pytest would collect a function of this name


def inside(title: str) -> str:
    """A title inside a sentence: a first word that is no name in lower case."""
    return title[0].lower() + title[1:] if title.split(maxsplit=1)[0] in NO_NAMES else title


def few(parts: list[str], last: str, kind: tuple[str, str], most: int = MOST_NAMED) -> str:
    """ "A", "A or B", "A, B and 3 other methods": no more than so many names, since a reader looks for one."""
    if len(parts) <= most:
        return listed(parts, last)
    left = len(parts) - most
    others = OTHERS.format(number=left, kind=kind[left > 1])
    return listed([*parts[:most], others], AND)


def given_name(facts: Mapping[str, Fact]) -> str:
    """What the figures should follow from: the counts, the pairs, the two printed risks."""
    return GIVEN.get(str(facts.get("given", "")), COUNTS)


def listed(parts: list[str], last: str) -> str:
    """ "A", "A or B", "A, B or C"."""
    return parts[0] if len(parts) == 1 else f"{COMMA.join(parts[:-1])}{last}{parts[-1]}"


def printed_text(figure: PrintedFigure) -> str:
    """The figure in the digits of the print, without its name: 0.54 (0.37 to 0.78)."""
    limits = _limits_printed(figure)
    if figure.estimate is None:
        return limits
    estimate = f"{as_printed(figure.estimate)}{unit(figure)}"
    if estimate in ONE_POINT:
        estimate = estimate.removesuffix("s")
    return f"{estimate} ({limits})" if limits else estimate


def _limits_printed(figure: PrintedFigure) -> str:
    low, high = (None if one is None else as_printed(one) for one in (figure.low, figure.high))
    if low and high:
        return f"{low}{numbers.TO}{high}"
    if low:
        return LOWER.format(limit=low)
    return UPPER.format(limit=high) if high else ""


def as_printed(number: PrintedNumber) -> str:
    """A number in the digits of the print."""
    if math.isinf(number.value):
        return numbers.plain(number.value)
    return numbers.fixed(number.value, number.decimals)


def unit(figure: PrintedFigure) -> str:
    """What stands behind a printed number that is no plain ratio."""
    if figure.unit == "percent":
        return " points" if figure.measure in ("risk_difference", "rate_difference") else "%"
    return " per 1,000" if figure.unit == "per-1000" else ""


def our_estimate(figure: PrintedFigure, facts: Mapping[str, Fact], name: str = "estimate") -> str:
    """Our estimate with one decimal more than the printed one has."""
    return f"{ours(facts.get(name), figure.estimate or figure.low or figure.high)}{unit(figure)}"


def our_limits(figure: PrintedFigure, facts: Mapping[str, Fact], prefix: str = "") -> str:
    """Our limits, each with one decimal more than its printed one has; ``prefix`` where they are another method's."""
    low = _first_finite(figure.low, figure.high, figure.estimate)
    high = _first_finite(figure.high, figure.low, figure.estimate)
    return f"{ours(facts.get(f'{prefix}low'), low)}{numbers.TO}{ours(facts.get(f'{prefix}high'), high)}"


def _first_finite(*printed: PrintedNumber | None) -> PrintedNumber | None:
    """The printed number whose decimals are taken; an infinity has none."""
    return next((one for one in printed if one is not None and math.isfinite(one.value)), None)


def our_figure(figure: PrintedFigure, facts: Mapping[str, Fact]) -> str:
    """Our estimate and, where there are any, our limits."""
    estimate = our_estimate(figure, facts)
    return f"{estimate} ({our_limits(figure, facts)})" if "low" in facts else estimate


def ours(value: Fact | None, printed: PrintedNumber | None) -> str:
    """A number of ours beside a printed one."""
    if not isinstance(value, int | float):
        return "…"
    decimals = 2 if printed is None else printed.decimals
    size = abs(value)
    if size >= HUGE and math.isfinite(size):
        return _as_power(value)
    return _as_power(value) if 0 < size < numbers.SMALLEST_RATIO else numbers.plain(value, decimals + 1)


def _as_power(value: float) -> str:
    """Three significant digits and their power of ten, where nobody would count the noughts."""
    digits, power = f"{abs(value):.2e}".split("e")
    return f"{numbers.MINUS if value < 0 else ''}{digits}×10{str(int(power)).translate(numbers.SUPERSCRIPT)}"
