"""What papers call their figures, and which measure each name means.

The names and abbreviations are those in use in print (common practice).
"""

from __future__ import annotations

import re
from collections.abc import Sequence

import msgspec

from fourcount.record.entry.readings import PrintedMeasure
from fourcount.record.entry.tokens import Token


class Name(msgspec.Struct, frozen=True):
    """A name of a figure: its measure, None for one that no count gives, and whether it says that it is adjusted.

    ``vague`` is a name, such as "difference", that is a measure of risk only where a percentage stands behind it.
    """

    measure: PrintedMeasure | None
    length: int
    adjusted: bool = False
    vague: bool = False


_PHRASES: dict[str, PrintedMeasure | None] = {
    "risk ratio": "risk_ratio",
    "relative risk": "risk_ratio",
    "relative risks": "risk_ratio",
    "risk ratios": "risk_ratio",
    "prevalence ratio": "risk_ratio",
    "proportion ratio": "risk_ratio",
    "odds ratio": "odds_ratio",
    "odds ratios": "odds_ratio",
    "relative odds": "odds_ratio",
    "hazard ratio": "hazard_ratio",
    "hazards ratio": "hazard_ratio",
    "hazard ratios": "hazard_ratio",
    "relative hazard": "hazard_ratio",
    "rate ratio": "rate_ratio",
    "rates ratio": "rate_ratio",
    "incidence ratio": "rate_ratio",
    "incidence rate ratio": "rate_ratio",
    "incidence density ratio": "rate_ratio",
    "relative rate": "rate_ratio",
    "risk difference": "risk_difference",
    "absolute risk difference": "risk_difference",
    "difference in risk": "risk_difference",
    "difference in risks": "risk_difference",
    "difference in proportions": "risk_difference",
    "absolute difference": "risk_difference",
    "absolute risk reduction": "risk_difference",
    "absolute reduction": "risk_difference",
    "absolute risk increase": "risk_difference",
    "absolute increase": "risk_difference",
    "attributable risk": "risk_difference",
    "percentage point difference": "risk_difference",
    "percentage-point difference": "risk_difference",
    "rate difference": "rate_difference",
    "incidence rate difference": "rate_difference",
    "relative risk reduction": "relative_reduction",
    "relative reduction": "relative_reduction",
    "vaccine efficacy": "relative_reduction",
    "protective efficacy": "relative_reduction",
    "number needed to treat": "number_needed",
    "number needed to harm": "number_needed",
    "number needed to benefit": "number_needed",
    "numbers needed to treat": "number_needed",
    "mean difference": None,
    "difference in means": None,
    "difference in mean": None,
    "standardised mean difference": None,
    "standardized mean difference": None,
    "median difference": None,
    "difference in medians": None,
    "correlation coefficient": None,
    "regression coefficient": None,
    "kappa": None,
    "beta": None,
    "ratio of means": None,
    "ratio of geometric means": None,
    "geometric mean ratio": None,
    "means ratio": None,
    "likelihood ratio": None,
    "cohen's d": None,
    "attributable fraction": None,
    "population attributable fraction": None,
    "positive likelihood ratio": None,
    "negative likelihood ratio": None,
    "sensitivity": None,
    "specificity": None,
    "accuracy": None,
    "correlation": None,
    "heterogeneity": None,
    "slope": None,
}
_VAGUE = ("difference", "between-group difference", "treatment difference", "group difference", "reduction")
_SHORT: dict[str, PrintedMeasure | None] = {
    "RR": "risk_ratio",
    "RRs": "risk_ratio",
    "PR": "risk_ratio",
    "CIR": "risk_ratio",
    "OR": "odds_ratio",
    "ORs": "odds_ratio",
    "POR": "odds_ratio",
    "HR": "hazard_ratio",
    "HRs": "hazard_ratio",
    "sHR": "hazard_ratio",
    "SHR": "hazard_ratio",
    "csHR": "hazard_ratio",
    "IRR": "rate_ratio",
    "RaR": "rate_ratio",
    "RD": "risk_difference",
    "ARD": "risk_difference",
    "ARR": "risk_difference",
    "ARI": "risk_difference",
    "IRD": "rate_difference",
    "RRR": "relative_reduction",
    "VE": "relative_reduction",
    "NNT": "number_needed",
    "NNTB": "number_needed",
    "NNTH": "number_needed",
    "NNH": "number_needed",
    "NNTs": "number_needed",
    "AUC": None,
    "AUROC": None,
    "ROM": None,
    "I2": None,
    "I\u00b2": None,
    "r": None,
    "R2": None,
    "\u03b2": None,
    "\u03ba": None,
    "\u03c1": None,
    "LR": None,
    "MD": None,
    "SMD": None,
    "WMD": None,
}
_ADJUSTED_SHORT = re.compile(r"(?:a|adj|m)(?P<short>OR|RR|HR|IRR|RD|PR)s?|A(?P<old>OR|HR|IRR)s?")
_LONGEST_PHRASE = 5
ADJUSTED = ("adjusted", "adj", "multivariable", "multivariable-adjusted", "multivariate", "fully-adjusted")
_INDEXED: dict[tuple[str, ...], tuple[PrintedMeasure | None, bool]] = {
    **{tuple(phrase.split()): ("risk_difference", True) for phrase in _VAGUE},
    **{tuple(phrase.split()): (measure, False) for phrase, measure in _PHRASES.items()},
}
_BEGINNINGS = {phrase[0] for phrase in _INDEXED}


def name_at(tokens: Sequence[Token], place: int) -> Name | None:
    """The name that begins at a token, the longest there is; "or" in small letters is no odds ratio."""
    token = tokens[place]
    if token.kind != "word":
        return None
    if token.lower in _BEGINNINGS:
        words = [each.lower for each in tokens[place : place + _LONGEST_PHRASE] if each.kind != "break"]
        for length in range(len(words), 0, -1):
            found = _INDEXED.get(tuple(words[:length]))
            if found:
                return Name(found[0], length, _said_adjusted(tokens, place), found[1])
    short = token.text.rstrip(".")
    if short in _SHORT:
        return Name(_SHORT[short], 1, _said_adjusted(tokens, place))
    adjusted = _ADJUSTED_SHORT.fullmatch(short)
    return Name(_SHORT[adjusted["short"] or adjusted["old"]], 1, True) if adjusted else None


def _said_adjusted(tokens: Sequence[Token], place: int) -> bool:
    """Whether "adjusted" stands among the two words before a name ("adjusted common odds ratio")."""
    return any(token.lower in ADJUSTED for token in tokens[max(0, place - 2) : place])
