"""What each measure means in the reader's own words, and what it is not: one function for every measure of a form."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from types import MappingProxyType

from fourcount.appraisal.findings import Figure, OutcomeFindings
from fourcount.record.outcome import Form, Outcome
from fourcount.record.paper import Choices
from fourcount.wording.form import crude
from fourcount.wording.meanings import pairs, person_time, printed, strata, unpaired
from fourcount.wording.meanings.unpaired import number_needed, odds_ratio_claim

__all__ = ["meaning", "number_needed", "odds_ratio_claim"]

Meaning = Callable[[Outcome, Figure, OutcomeFindings, Choices], str]

UNPAIRED: Mapping[str, Meaning] = MappingProxyType(
    {
        "risk_difference": unpaired.difference,
        "risk_reference": unpaired.risk_reference,
        "risk_index": unpaired.risk_index,
        "risk_ratio": unpaired.risk_ratio,
        "other_risk_ratio": unpaired.other_risk_ratio,
        "odds_ratio": unpaired.odds_ratio,
        "odds_reference": unpaired.odds_reference,
        "odds_index": unpaired.odds_index,
    }
)
FORMS: Mapping[Form, Mapping[str, Meaning]] = MappingProxyType(
    {
        "pairs": {
            "pair_difference": pairs.difference,
            "pair_risk_reference": pairs.risk_reference,
            "pair_risk_index": pairs.risk_index,
            "pair_ratio": pairs.ratio,
            "pair_odds_ratio": pairs.odds_ratio,
        },
        "person-time": {
            "rate_difference": person_time.difference,
            "rate_reference": person_time.rate_reference,
            "rate_index": person_time.rate_index,
            "rate_ratio": person_time.ratio,
        },
        "risk-at-time": {
            **UNPAIRED,
            "risk_reference": printed.risk_reference,
            "risk_index": printed.risk_index,
        },
        "strata": {
            **UNPAIRED,
            "pooled_risk_difference": strata.difference,
            "pooled_risk_ratio": strata.risk_ratio,
            "pooled_odds_ratio": strata.odds_ratio,
        },
    }
)


def meaning(key: str, outcome: Outcome, figure: Figure, findings: OutcomeFindings, choices: Choices) -> str:
    """What a measure with an estimate says in this table, and what it does not say."""
    if findings.form == "effect-only":
        return printed.effect(key, outcome, figure, findings, choices)
    found = crude(findings) if findings.form == "strata" and not key.startswith("pooled_") else findings
    return FORMS.get(findings.form, UNPAIRED)[key](outcome, figure, found, choices)
