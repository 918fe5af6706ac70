"""Kinds of measures, the methods behind them in a word, and the few fixed words of their lines."""

from __future__ import annotations

from typing import Literal

from fourcount.record.paper import Choices

Kind = Literal["difference", "risk", "ratio", "rate", "rate_difference", ""]

KINDS: dict[str, Kind] = {
    "risk_difference": "difference",
    "risk_reference": "risk",
    "risk_index": "risk",
    "risk_ratio": "ratio",
    "odds_ratio": "ratio",
    "pair_difference": "difference",
    "pair_risk_reference": "risk",
    "pair_risk_index": "risk",
    "pair_ratio": "ratio",
    "pair_odds_ratio": "ratio",
    "rate_difference": "rate_difference",
    "rate_reference": "rate",
    "rate_index": "rate",
    "rate_ratio": "ratio",
    "hazard_ratio": "ratio",
    "pooled_risk_difference": "difference",
    "pooled_risk_ratio": "ratio",
    "pooled_odds_ratio": "ratio",
    "attributable_exposed": "risk",
    "prevented_exposed": "risk",
    "attributable_population": "risk",
}
"""Measures of one kind are written alike and share a scale."""

IN_THE_STUDY = " in the study"
NO_SPAN = "time span not given"
NOT_DETERMINED = "not determined"
WITHHELD = "withheld"
FOLLOWS = "follows"
NOT_PRINTED = "not printed"
APPROXIMATE = "{method}, approximate"

METHOD_WORDS = {
    "newcombe": "score",
    "tango": "score",
    "bonett-price": "score",
    "conditional-mid-p": "mid-P",
    "conditional-exact": "exact",
    "wilson": "score",
    "clopper-pearson": "exact",
    "wald": "textbook",
    "katz": "textbook",
    "log": "textbook",
    "score": "score",
    "exact": "exact",
    "miettinen-nurminen": "score",
    "sato": "Mantel–Haenszel",
    "greenland-robins": "Mantel–Haenszel",
    "robins-breslow-greenland": "Mantel–Haenszel",
    "square-and-add": "from the printed limits",
    "attributable-population": "log",
    "printed": "as printed",
}
"""A method in the word that its line has room for; its name in full stands in the working."""

NEVER_EXACT = ("newcombe", "tango", "bonett-price", "miettinen-nurminen")


def method_word(method: str, choices: Choices) -> str:
    """The kind of method behind a figure; in the exact family what is not exact says so."""
    word = METHOD_WORDS.get(method, method)
    approximate = choices.family == "exact" and method in NEVER_EXACT
    return APPROXIMATE.format(method=word) if approximate else word
