"""Effects that are carried to a patient: what each is called, and its value as the print or the program gives it."""

from __future__ import annotations

from fourcount.appraisal.carrying.spans import spans_of
from fourcount.appraisal.findings import Carriable, CarriedEffect, Figure, Gap, PatientFindings
from fourcount.record.entry.readings import Duration
from fourcount.record.outcome import Outcome
from fourcount.wording import limits, names
from fourcount.wording.durations import duration
from fourcount.wording.lines.as_printed import carried_texts

KEPT = "{name} {value}{over}, kept constant"
ANY_SPAN = ("hazard_ratio", "rate_ratio")
"""Effects that are the same over every time; the others are kept over the study's, and then carried to another one."""

PER_100 = " per 100"
OF_MEASURES = {
    "pooled_": "pooled {name}",
    "pair_odds_ratio": "{name} of the pairs",
    "pair_": "paired {name}",
}
"""What an effect's name becomes by the beginning of its measure's key; the first that fits."""

ADJUSTED = "adjusted {name}"


def carriable_name(outcome: Outcome, one: Carriable) -> str:
    """``adjusted odds ratio``."""
    return _name(outcome, one.effect, one.measure, adjusted=one.adjusted)


def carriable_words(outcome: Outcome, one: Carriable) -> str:
    """``risk ratio 0.54, kept constant``: one choice of the effect to carry, and over which time beside another one."""
    name = carriable_name(outcome, one)
    if isinstance(one.figure.estimate, Gap):
        return name
    value, _ = _texts(outcome, one.effect, one.figure, adjusted=one.adjusted)
    spans = spans_of(outcome, any_span=False)
    study = None if isinstance(spans, Gap) or spans.other is None else spans.study
    return KEPT.format(name=name, value=value, over=_over(one.effect, study))


def carried_name(outcome: Outcome, patient: PatientFindings) -> str:
    """What the effect that was carried is called."""
    return _name(outcome, patient.effect, patient.measure, adjusted=patient.adjusted)


def kept_constant(outcome: Outcome, patient: PatientFindings) -> str:
    """``risk ratio 0.54 (0.37 to 0.78) kept constant``; where it is carried to another span, over the study's."""
    value, interval = value_and_limits(outcome, patient)
    over = _over(patient.effect, None if patient.other_span is None else patient.study_span)
    return f"{carried_name(outcome, patient)} {value}{limits.bracketed(interval)} kept constant{over}"


def value_and_limits(outcome: Outcome, patient: PatientFindings) -> tuple[str, str]:
    """The effect that was carried and its interval, which is "" where there is none."""
    value, interval = _texts(outcome, patient.effect, patient.carried, adjusted=patient.adjusted)
    return value, "" if isinstance(patient.carried.interval, Gap) else interval


def _over(effect: CarriedEffect, study: Duration | None) -> str:
    """`` over 12 months``: the time over which the effect is the same for everybody."""
    return f" over {duration(study)}" if study is not None and effect not in ANY_SPAN else ""


def _texts(outcome: Outcome, effect: CarriedEffect, figure: Figure, *, adjusted: bool) -> tuple[str, str]:
    value, interval = carried_texts(effect, outcome, figure, adjusted=adjusted)
    return f"{value}{PER_100 if effect == 'risk_difference' else ''}", interval


def _name(outcome: Outcome, effect: CarriedEffect, measure: str, *, adjusted: bool) -> str:
    """Which of several effects it is: the pooled one of strata, that of pairs, the adjusted one of a print."""
    name = names.effect_name(outcome, effect)
    if adjusted:
        return ADJUSTED.format(name=name)
    form = next((form for begins, form in OF_MEASURES.items() if measure.startswith(begins)), "{name}")
    return form.format(name=name)
