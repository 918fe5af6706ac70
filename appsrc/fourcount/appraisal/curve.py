"""Each effect kept constant across starting risks, and the odds ratio as a risk ratio across them."""

from __future__ import annotations

import math
from collections.abc import Callable

from fourcount.appraisal.findings import Carriable, Figure, Gap, OutcomeFindings, PatientFindings
from fourcount.appraisal.findings.curve import Curve, CurveLine, CurveMark, CurvePoint
from fourcount.stats.conversion import risk_ratio_from_odds_ratio, risk_with

STEPS = 120
SAME = 1e-9
STUDY_RISKS = (("risk_reference", "risk_index"), ("pair_risk_reference", "pair_risk_index"))

Value = Callable[[float, float], float | Gap]
"""What an effect's value comes to at a starting risk."""


def curve(findings: OutcomeFindings, reach: float = 1.0) -> Curve:
    """The lines of all effects that can be carried, for starting risks from 0 up to ``reach``.

    Bands are the effect's own limits at each starting risk, which is taken as certain there. Nothing is cut: a line
    ends where its risk reaches 100%, or 0. Sources: Cochrane Handbook 15.4.4; Zhang and Yu 1998, JAMA 280:1690.
    """
    marks = _marks(findings)
    drawn = [(one, line) for one in findings.carriable if (line := _risks(one, reach, marks)) is not None]
    return Curve(
        lines=tuple(line for _, line in drawn),
        ratios=tuple(_ratios(one, reach, marks) for one, _ in drawn if one.effect == "odds_ratio"),
        marks=marks,
        left_out=tuple(one for one in findings.carriable if all(one is not other for other, _ in drawn)),
        carried=_carried([one for one, _ in drawn], findings.patient),
        reach=reach,
    )


def highest_start(findings: OutcomeFindings) -> float:
    """The highest starting risk that is marked, the study's or the patient's; 0 where none is."""
    return max((mark.without for mark in _marks(findings)), default=0.0)


def _risks(one: Carriable, reach: float, marks: tuple[CurveMark, ...]) -> CurveLine | None:
    """The risk with; None for an effect without a value, or one that leads nowhere but to nobody or everybody."""
    estimate = one.figure.estimate
    if isinstance(estimate, Gap) or math.isinf(estimate):
        return None

    def value(effect: float, start: float) -> float | Gap:
        return risk_with(one.effect, effect, start)

    first, last = _ends(one, estimate)
    points = _points(one, value, reach, marks)
    return CurveLine(effect=one, points=points, first=first, last=last)


def _ratios(one: Carriable, reach: float, marks: tuple[CurveMark, ...]) -> CurveLine:
    """An odds ratio as a risk ratio; at a starting risk of 100% it is 1, but 0 there is undetermined."""

    def value(effect: float, start: float) -> float | Gap:
        if effect == 0.0 and start == 1.0:
            return Gap("undetermined-at-baseline")
        ratio = risk_ratio_from_odds_ratio(effect, start)
        return Gap("undetermined-at-baseline") if math.isinf(ratio) else ratio

    return CurveLine(effect=one, points=_points(one, value, reach, marks), first=0.0, last=1.0)


def _points(one: Carriable, value: Value, reach: float, marks: tuple[CurveMark, ...]) -> tuple[CurvePoint, ...]:
    values = [effect for effect in _three(one.figure) if not isinstance(effect, Gap)]
    ends = [end for effect in values for end in _ends(one, effect)]
    starts = {reach * step / STEPS for step in range(STEPS + 1)} | {mark.without for mark in marks} | set(ends)
    return tuple(_point(one.figure, value, start) for start in sorted(starts) if 0.0 <= start <= reach)


def _point(figure: Figure, value: Value, start: float) -> CurvePoint:
    estimate, low, high = (effect if isinstance(effect, Gap) else value(effect, start) for effect in _three(figure))
    return CurvePoint(start=start, value=estimate, low=low, high=high)


def _three(figure: Figure) -> tuple[float | Gap, float | Gap, float | Gap]:
    """The estimate and both limits."""
    interval = figure.interval
    if isinstance(interval, Gap):
        return figure.estimate, interval, interval
    return figure.estimate, interval.low, interval.high


def _ends(one: Carriable, effect: float) -> tuple[float, float]:
    """The lowest and the highest starting risk at which an effect gives a risk."""
    if one.effect == "risk_difference":
        return max(0.0, -effect), min(1.0, 1.0 - effect)
    if one.effect == "risk_ratio" and effect > 1.0:
        return 0.0, 1.0 / effect
    return 0.0, 1.0


def _carried(drawn: list[Carriable], patient: PatientFindings | Gap) -> int:
    """The place of the effect that the patient is told; -1 where that one has no line."""
    if isinstance(patient, Gap):
        return -1
    told = (patient.effect, patient.measure, patient.adjusted)
    exact = (place for place, one in enumerate(drawn) if (one.effect, one.measure, one.adjusted) == told)
    like = (place for place, one in enumerate(drawn) if (one.effect, one.adjusted) == (told[0], told[2]))
    return next(exact, next(like, -1))


def _marks(findings: OutcomeFindings) -> tuple[CurveMark, ...]:
    """The study's own point, then the patient's, low to high; one where they are the same."""
    study = _study(findings)
    usual = findings.patient
    if isinstance(usual, Gap):
        return (study,) if study else ()
    told = [_patient(one, study) for one in (usual.low, usual, usual.high) if isinstance(one, PatientFindings)]
    if study is None:
        return tuple(told)
    same = [mark for mark in told if _same(mark, study)]
    if not same:
        return (study, *told)
    both = CurveMark(
        of_study=True,
        of_patient=True,
        rank=same[0].rank,
        without=study.without,
        with_=study.with_,
        low=same[0].low,
        high=same[0].high,
    )
    return (both, *(mark for mark in told if mark is not same[0]))


def _same(one: CurveMark, other: CurveMark) -> bool:
    if isinstance(one.with_, Gap) or isinstance(other.with_, Gap):
        return False
    return abs(one.without - other.without) < SAME and abs(one.with_ - other.with_) < SAME


def _study(findings: OutcomeFindings) -> CurveMark | None:
    for reference, index in STUDY_RISKS:
        figures = findings.measures.get(reference), findings.measures.get(index)
        risks = [figure.estimate for figure in figures if isinstance(figure, Figure)]
        if len(risks) == 2 and not isinstance(risks[0], Gap) and not isinstance(risks[1], Gap):
            none = Gap("bare-starting-risk")
            return CurveMark(
                of_study=True, of_patient=False, rank="", without=risks[0], with_=risks[1], low=none, high=none
            )
    return None


def _patient(patient: PatientFindings, study: CurveMark | None) -> CurveMark:
    """Where the carried effect takes the starting risk within the study's own time span.

    A patient of the study's own risk is told the study's risks themselves, whatever effect is chosen.
    """
    estimate, interval = patient.carried.estimate, patient.with_.interval
    with_ = estimate if isinstance(estimate, Gap) else risk_with(patient.effect, estimate, patient.baseline)
    if patient.range_from == "table" and study is not None:
        with_ = study.with_
    if patient.other_span is not None or isinstance(interval, Gap):
        low: float | Gap = Gap("bare-starting-risk")
        high: float | Gap = Gap("bare-starting-risk")
    else:
        low, high = interval.low, interval.high
    return CurveMark(
        of_study=False, of_patient=True, rank=patient.rank, without=patient.baseline, with_=with_, low=low, high=high
    )
