"""What a picture of a patient draws: the unwelcome outcome, whichever the table counts."""

from __future__ import annotations

from fourcount.appraisal.findings import Figure, Gap, Interval, PatientFindings, Range


def other_side(patient: PatientFindings) -> PatientFindings:
    """The patient's risks of not having the event, and their difference; all else stays as it is.

    The number needed keeps its kind, since the direction and whether the event is welcome turn together; the
    relative figure stays the event's own.
    """
    return PatientFindings(
        baseline=1 - patient.baseline,
        baseline_from=patient.baseline_from,
        effect=patient.effect,
        carried=patient.carried,
        without=_turned(patient.without, 1.0),
        with_=_turned(patient.with_, 1.0),
        difference=_turned(patient.difference, 0.0),
        number_needed=patient.number_needed,
        risk_ratio=patient.risk_ratio,
        range_from=patient.range_from,
    )


def _turned(figure: Figure, whole: float) -> Figure:
    """``whole`` minus a figure; its limits change places."""
    estimate = figure.estimate if isinstance(figure.estimate, Gap) else whole - figure.estimate + 0.0
    interval = figure.interval
    if isinstance(interval, Gap):
        return Figure(estimate=estimate, interval=interval, method=figure.method)
    low, high = (limit if isinstance(limit, Gap) else whole - limit + 0.0 for limit in (interval.high, interval.low))
    turned = (
        Range(low=low, high=high, adjusted=interval.adjusted)
        if isinstance(low, Gap) or isinstance(high, Gap)
        else Interval(low=low, high=high, adjusted=interval.adjusted)
    )
    return Figure(estimate=estimate, interval=turned, method=figure.method)
