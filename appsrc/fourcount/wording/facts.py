"""Facts of a gap, a mark or a caution put into its sentence, each in its own way of being written.

A sentence is a template with the facts' names in braces. A fact that is not there leaves a stand-in,
never an exception: a sentence with a hole still says more than none.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from types import MappingProxyType

from fourcount.wording import labels, numbers

Fact = str | int | float

LONGEST_QUOTE = 40
MEASURE_NAMES = {
    "risk": "risk",
    "risk_index": "risk",
    "risk_reference": "risk",
    "odds_index": "odds",
    "odds_reference": "odds",
    "risk_difference": "difference",
    "number_needed": "number needed",
    "risk_ratio": "risk ratio",
    "other_risk_ratio": "risk ratio of not having the event",
    "odds_ratio": "odds ratio",
    "hazard_ratio": "hazard ratio",
    "rate": "rate",
    "rate_index": "rate",
    "rate_reference": "rate",
    "rate_difference": "rate difference",
    "rate_ratio": "rate ratio",
    "pair_risk_index": "risk",
    "pair_risk_reference": "risk",
    "pair_difference": "paired difference",
    "pair_ratio": "paired risk ratio",
    "pair_odds_ratio": "odds ratio of the pairs",
    "pooled_risk_difference": "pooled difference",
    "pooled_risk_ratio": "pooled risk ratio",
    "pooled_odds_ratio": "pooled odds ratio",
}
RATIO_OF_PREVALENCES = "prevalence ratio"
COUNT_WORDS = ("None", "One", "Two", "Three", "Four")
STAND_INS = {
    "text": "This",
    "comma": "1,204",
    "baseline": "this starting risk",
    "study": "risk",
    "risk": "so low a risk",
    "effect": "effect",
    "measure": "figure",
    "design": "study without randomisation",
    "count": "Some",
    "events": "the count",
    "total": "another number",
    "typed": "one number",
    "limit": "1,000,000,000",
    "counts": "several counts",
    "how_many": "several",
    "unit": "another unit",
    "low": "the lower one",
    "high": "the upper one",
    "estimate": "the estimate",
    "p": "its p",
    "level": "its own",
    "chosen": "another",
    "reason": "Intervals that take people of one cluster for independent are too narrow.",
    "scenarios": "some scenarios",
    "adjusted_for": "",
    "lost": "Some",
    "randomised": "some",
    "analysed": "others",
    "design_effect": "clusters",
    "icc": "as typed",
    "mean_size": "as typed",
    "crude": "one figure",
    "apart": "differ",
    "pooled": "another",
    "strata": "several",
    "small": "some",
    "side": "one side",
    "label": "comparison",
}


def told(template: str, facts: Mapping[str, Fact], said: Mapping[str, str] = MappingProxyType({})) -> str:
    """The template with its facts in their places; ``said`` are facts that are words already, put in as they are."""
    written = _Written(facts)
    written.update(said)
    return template.format_map(written)


def quoted(text: str) -> str:
    """What somebody typed, on one line and cut to forty characters."""
    line = " ".join(text.split())
    return line if len(line) <= LONGEST_QUOTE else f"{line[: LONGEST_QUOTE - 1]}…"


class _Written(dict[str, str]):
    """The facts as text; a name that is missing gives its stand-in."""

    def __init__(self, facts: Mapping[str, Fact]) -> None:
        super().__init__({name: _written(name, value) for name, value in facts.items()})
        self["ratio_name"] = RATIO_OF_PREVALENCES if facts.get("design") == "survey" else MEASURE_NAMES["risk_ratio"]
        for name in ("effect", "measure"):
            if facts.get(name) == "risk_ratio":
                self[name] = self["ratio_name"]

    def __missing__(self, name: str) -> str:
        return STAND_INS.get(name, "…")


def _written(name: str, value: Fact) -> str:
    writer = WRITERS.get(name)
    if writer is not None and isinstance(value, int | float) is (name in NUMERIC):
        return writer(value)
    if isinstance(value, float):
        return numbers.ratio(value) if value >= 0 else numbers.plain(value)
    return numbers.whole(value) if isinstance(value, int) else quoted(value)


def _quantity(value: float) -> str:
    """An effect, or a count of people."""
    return numbers.whole(value) if isinstance(value, int) else numbers.ratio(value)


def _count_word(value: int) -> str:
    return COUNT_WORDS[value] if 0 <= value < len(COUNT_WORDS) else numbers.whole(value)


def _measure_name(key: str) -> str:
    return MEASURE_NAMES.get(key, key)


def _design_name(key: str) -> str:
    return labels.DESIGNS.get(key, key)


NUMERIC = frozenset(
    {
        "p",
        "level",
        "chosen",
        "icc",
        "mean_size",
        "typed",
        "total",
        "baseline",
        "study",
        "risk",
        "odds_ratio",
        "risk_ratio",
        "value",
        "count",
    }
)
WRITERS: dict[str, Callable[..., str]] = {
    "typed": numbers.quantity,
    "icc": numbers.quantity,
    "mean_size": numbers.quantity,
    "p": numbers.p_phrase,
    "level": numbers.level,
    "chosen": numbers.level,
    "total": numbers.quantity,
    "baseline": numbers.percent_given,
    "study": numbers.percent,
    "risk": numbers.percent,
    "odds_ratio": numbers.ratio,
    "risk_ratio": numbers.ratio,
    "value": _quantity,
    "count": _count_word,
    "effect": _measure_name,
    "measure": _measure_name,
    "design": _design_name,
}
