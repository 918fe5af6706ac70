"""What each study design supports, in one table."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass, field, replace
from types import MappingProxyType

from fourcount.appraisal.findings import MEASURES, PAIR_MEASURES, RATE_MEASURES, TIMED_MEASURES, CarriedEffect
from fourcount.record.outcome import PAIRED_DESIGNS, Design, Outcome

OBSERVATIONAL: tuple[Design, ...] = ("cohort", "survey", "case-control", "matched")
"""The designs whose groups are compared as they are found."""

Withheld = Mapping[str, str]

NOTHING_WITHHELD: Withheld = MappingProxyType({})


def _all(measures: tuple[str, ...], reason: str) -> Withheld:
    return MappingProxyType(dict.fromkeys(measures, reason))


_NO_RISK = _all(tuple(key for key in MEASURES if key != "odds_ratio"), "design-case-control")


@dataclass(frozen=True, kw_only=True, slots=True)
class Support:
    """What one design supports.

    ``withheld`` maps a measure to the key of the reason for which it is not given. ``carries`` lists the effects of a
    table that may be carried to a patient, the usual one first. ``own_starting_risk`` says whether the reference
    group's risk is a risk of people at all. ``patient_number_needed`` is the reason for which the patient has none, if
    any. ``refused`` is the reason for which the table says nothing at all in this design, if any.
    """

    withheld: Withheld = field(default_factory=lambda: NOTHING_WITHHELD)
    carries: tuple[CarriedEffect, ...] = ("risk_ratio", "odds_ratio", "risk_difference")
    own_starting_risk: bool = True
    patient_number_needed: str | None = None
    refused: str | None = None


def _refused(reason: str) -> Support:
    return Support(withheld=_all(MEASURES, reason), carries=(), own_starting_risk=False, refused=reason)


SUPPORT: Mapping[Design, Support] = MappingProxyType(
    {
        "trial": Support(),
        "cohort": Support(),
        # A prevalence at one moment has no time in which one more person could benefit.
        "survey": Support(
            withheld=MappingProxyType({"number_needed": "design-survey-nnt"}), patient_number_needed="design-survey-nnt"
        ),
        # The investigator chose how many cases and controls there are: only the odds ratio does not depend on
        # that (Cornfield 1951, from memory), so no risk ratio of this table can be carried either.
        "case-control": Support(withheld=_NO_RISK, carries=("odds_ratio",), own_starting_risk=False),
        # The two groups hold the same people, or people chosen to be alike: unpaired formulas do not hold for them.
        **{design: _refused("design-needs-pairs") for design in PAIRED_DESIGNS},
    }
)
"""What a table of four counts gives in each design."""


def support_of(outcome: Outcome) -> Support:
    """What the design supports, of people followed for one time."""
    support = SUPPORT[outcome.design]
    if support.refused is None and outcome.counting == "events":
        # Several events may be one person's, so they are no share of the people.
        return _refused("events-not-people")
    if not outcome.follow_up_varied or support.patient_number_needed is not None or not support.own_starting_risk:
        return support
    return replace(
        support,
        withheld=MappingProxyType({**support.withheld, "number_needed": "follow-up-varied"}),
        patient_number_needed="follow-up-varied",
    )


_PAIRS: Mapping[Design, Withheld] = MappingProxyType(
    {
        "matched": _all(tuple(key for key in PAIR_MEASURES if key != "pair_odds_ratio"), "design-matched"),
        "paired": NOTHING_WITHHELD,
        "before-after": MappingProxyType({"number_needed": "design-before-after"}),
    }
)
_RATES: Mapping[Design, Withheld] = MappingProxyType(
    {
        **{design: _all(RATE_MEASURES, "design-no-rates") for design in ("survey", "case-control")},
        **{design: _all(RATE_MEASURES, "design-needs-pairs") for design in PAIRED_DESIGNS},
    }
)
_TIMED: Mapping[Design, Withheld] = MappingProxyType(
    {
        "survey": MappingProxyType({"number_needed": "design-survey-nnt"}),
        "case-control": _all(TIMED_MEASURES, "design-case-control"),
        **{design: _all(TIMED_MEASURES, "design-needs-pairs") for design in PAIRED_DESIGNS},
    }
)
_EFFECTS: Mapping[Design, Withheld] = MappingProxyType(
    {
        "survey": _all(("hazard_ratio", "rate_ratio", "rate_difference"), "design-no-rates"),
        "case-control": _all(("risk_ratio", "risk_difference", "rate_difference"), "design-case-control"),
        "matched": _all(
            ("risk_ratio", "hazard_ratio", "rate_ratio", "risk_difference", "rate_difference"), "design-matched"
        ),
    }
)


def withheld_of_pairs(outcome: Outcome) -> Withheld:
    """Which measures of pairs are not given, and why."""
    if outcome.design not in _PAIRS:
        return _all(PAIR_MEASURES, "pairs-need-design")
    if outcome.counting == "events":
        return _all(PAIR_MEASURES, "events-not-people")
    varied = {"number_needed": "follow-up-varied"} if outcome.follow_up_varied else {}
    return MappingProxyType({**varied, **_PAIRS[outcome.design]})


def withheld_of_rates(design: Design) -> Withheld:
    """Which measures of person-time are not given, and why."""
    return _RATES.get(design, NOTHING_WITHHELD)


def withheld_of_timed(design: Design) -> Withheld:
    """Which measures of printed risks are not given, and why."""
    return _TIMED.get(design, NOTHING_WITHHELD)


def withheld_of_effects(design: Design) -> Withheld:
    """Which printed effects a design cannot have, and why."""
    return _EFFECTS.get(design, NOTHING_WITHHELD)
