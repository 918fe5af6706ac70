"""Findings as other programs read them: plain dictionaries, lists, numbers and strings, ready for strict JSON.

Other programs rely on the keys: add some, never rename one. Fractions, not percentages, and unrounded; rates are events
in one unit of person-time. An infinity is the string "inf" or "-inf". What cannot be given is
``{"withheld": key, "text": sentence}`` in its place, at any depth.
"""

from __future__ import annotations

from collections.abc import Mapping

from fourcount.appraisal.every import conditional_odds_ratio, every_interval, every_p
from fourcount.appraisal.findings import (
    PAIR_MEASURES,
    RATE_MEASURES,
    TIMED_MEASURES,
    Conversion,
    Figure,
    Gap,
    Interval,
    OutcomeFindings,
)
from fourcount.publish.contract_extras import extras_json
from fourcount.publish.contract_figures import Json, figure_json, measure_json, pair_json, value_json, withheld_json
from fourcount.publish.contract_patient import line_json, patient_json, tells_of_a_patient
from fourcount.publish.contract_strata import strata_json
from fourcount.record.outcome import Form, Outcome
from fourcount.record.paper import Choices
from fourcount.wording.cautions import caution_text
from fourcount.wording.form import lacking, level_of
from fourcount.wording.person_time import unit

__all__ = ["FORMAT", "PUBLISHED", "Json", "contract"]

FORMAT = 1
PUBLISHED = ("risk_index", "risk_reference", "risk_difference", "number_needed", "risk_ratio", "odds_ratio")
PUBLISHED_OF: Mapping[Form, tuple[str, ...]] = {
    "pairs": PAIR_MEASURES,
    "person-time": RATE_MEASURES,
    "risk-at-time": TIMED_MEASURES,
}
"""What stands under ``measures``, where that is not what four counts have."""

FROM_PRINT: tuple[Form, ...] = ("risk-at-time", "effect-only")


def contract(outcome: Outcome, choices: Choices, findings: OutcomeFindings) -> Json:
    """All that one outcome says, every method and test included."""
    given: Json = {"patient": patient_json(findings.patient)} if tells_of_a_patient(outcome, findings.patient) else {}
    return {
        "format": FORMAT,
        "design": outcome.design,
        "level": choices.level,
        "intervals": choices.family,
        "form": findings.form,
        **_of_the_form(outcome, choices, findings),
        "measures": {key: measure_json(findings.measures[key]) for key in _published(findings)},
        **_every_method(outcome, choices, findings),
        "conversion": _conversion(findings.conversion),
        **given,
        **({} if findings.line is None else {"line": line_json(findings.line)}),
        **({} if findings.strata is None else {"strata": strata_json(findings.strata)}),
        "extras": extras_json(findings.extras),
        "cautions": [{"key": caution.key, "text": caution_text(caution)} for caution in findings.cautions],
    }


def _published(findings: OutcomeFindings) -> tuple[str, ...]:
    """The keys of a form's measures; a printed effect is the only one of its form."""
    if findings.form == "effect-only":
        return tuple(findings.measures)
    return PUBLISHED_OF.get(findings.form, PUBLISHED)


def _of_the_form(outcome: Outcome, choices: Choices, findings: OutcomeFindings) -> Json:
    """The unit of person-time; the level of printed limits, which the record's level does not change."""
    if findings.form == "person-time":
        return {"unit": unit(outcome)}
    return {"printed_level": level_of(findings, choices)} if findings.form in FROM_PRINT else {}


def _every_method(outcome: Outcome, choices: Choices, findings: OutcomeFindings) -> Json:
    """Every method of every measure and every test; ``adjusted_methods`` names those that added to the counts.

    Two numbers cannot say that a count was altered on the way, so the methods that do are listed beside them.
    """
    nothing = lacking(findings)
    if nothing is not None:
        gap = withheld_json(nothing)
        return {"methods": gap, "adjusted_methods": {}, "conditional_odds_ratio": gap, "tests": gap}
    intervals = every_interval(outcome, findings, choices.level)
    adjusted = {measure: _adjusted(methods) for measure, methods in intervals.items()}
    return {
        "methods": {
            measure: {key: pair_json(interval) for key, interval in methods.items()}
            for measure, methods in intervals.items()
        },
        "adjusted_methods": {measure: keys for measure, keys in adjusted.items() if keys},
        "conditional_odds_ratio": value_json(_conditional(findings)),
        "tests": {key: value_json(p) for key, p in every_p(outcome, findings).items()},
    }


def _conditional(findings: OutcomeFindings) -> float | Gap:
    """The odds ratio given the margins: of four counts the likeliest one, of pairs that of those that differ."""
    if not isinstance(findings.counts, Gap):
        return conditional_odds_ratio(findings.counts)
    figure = findings.measures.get("pair_odds_ratio", findings.counts)
    return figure.estimate if isinstance(figure, Figure) else findings.counts


def _adjusted(methods: Mapping[str, Interval | Gap]) -> dict[str, str]:
    return {
        key: interval.adjusted
        for key, interval in methods.items()
        if isinstance(interval, Interval) and interval.adjusted is not None
    }


def _conversion(conversion: Conversion | Gap) -> Json:
    if isinstance(conversion, Gap):
        return withheld_json(conversion)
    return {
        "baseline": conversion.baseline,
        "baseline_from": conversion.baseline_from,
        "risk_ratio": figure_json(conversion.risk_ratio),
    }
