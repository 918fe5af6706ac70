"""The table's own reference risk with the table's own crude effect: the table again, and its direct intervals.

Combining the reference risk with the effect would count the reference group twice (Newcombe 2011, Commun Stat Theory
Methods 40:3154, from memory).
"""

from __future__ import annotations

from fourcount.appraisal.carrying.study import OwnRisks
from fourcount.appraisal.conversion import mapped
from fourcount.appraisal.findings import Figure, Gap, Interval, Range
from fourcount.appraisal.reach import risk_within_reach, within_reach
from fourcount.stats.hazards import over_spans
from fourcount.stats.methods import method
from fourcount.stats.results import LimitedRisk, TimedRisks
from fourcount.stats.timed import timed_difference, timed_ratio

SQUARE_AND_ADD = "square-and-add"
RELATED = Gap("other-span-pairs")


def direct(own: OwnRisks) -> OwnRisks:
    """The study's figures, without limits that no risk can reach."""
    return OwnRisks(
        index=risk_within_reach(own.index),
        reference=risk_within_reach(own.reference),
        difference=within_reach(own.difference, own.index, own.reference),
        ratio=own.ratio,
        level=own.level,
        related=own.related,
    )


def over_another_span(own: OwnRisks, spans: float) -> OwnRisks:
    """Both risks and their limits through constant hazards; difference and ratio by square-and-add of the new limits.

    Each limit of a risk is that risk's at another span, since the map is monotone. Of two independent groups Newcombe's
    construction (1998, Stat Med 17:873) then gives the limits of what parts them; of the same people it does not.
    """
    at_hand = direct(own)
    index, reference = at_span(at_hand.index, spans), at_span(at_hand.reference, spans)
    timed = _timed(index, reference, own)
    bare = _bare(index, reference, own.level)
    return OwnRisks(
        index=index,
        reference=reference,
        difference=Figure(
            estimate=bare if isinstance(bare, Gap) else timed_difference(bare),
            interval=_interval("timed_difference", timed),
            method=SQUARE_AND_ADD,
        ),
        ratio=Figure(
            estimate=bare if isinstance(bare, Gap) else timed_ratio(bare),
            interval=_interval("timed_ratio", timed),
            method=SQUARE_AND_ADD,
        ),
        level=own.level,
        related=own.related,
    )


def at_span(risk: Figure, spans: float) -> Figure:
    """A risk and its limits over so many times its span, the hazard being constant."""
    return risk if spans == 1.0 else mapped(risk, lambda value: over_spans(value, spans))


def _bare(index: Figure, reference: Figure, level: float) -> TimedRisks | Gap:
    if isinstance(index.estimate, Gap):
        return index.estimate
    if isinstance(reference.estimate, Gap):
        return reference.estimate
    return TimedRisks(index=_certain(index.estimate), reference=_certain(reference.estimate), level=level)


def _certain(risk: float) -> LimitedRisk:
    return LimitedRisk(risk=risk, low=risk, high=risk)


def _timed(index: Figure, reference: Figure, own: OwnRisks) -> TimedRisks | Gap:
    """Both risks with their limits, or why nothing follows from these."""
    if own.related:
        return RELATED
    one, other = _limited(index), _limited(reference)
    if isinstance(one, Gap):
        return one
    return other if isinstance(other, Gap) else TimedRisks(index=one, reference=other, level=own.level)


def _limited(risk: Figure) -> LimitedRisk | Gap:
    if isinstance(risk.estimate, Gap):
        return risk.estimate
    interval = risk.interval
    if isinstance(interval, Range):
        return interval.low if isinstance(interval.low, Gap) else Gap("formula-beyond-one")
    if not isinstance(interval, Interval):
        return interval
    # An exact limit can lie a last bit inside its own estimate where that is 0 or 1.
    low, high = min(interval.low, risk.estimate), max(interval.high, risk.estimate)
    return LimitedRisk(risk=risk.estimate, low=low, high=high)


def _interval(measure: str, timed: TimedRisks | Gap) -> Interval | Gap:
    return timed if isinstance(timed, Gap) else method(measure, SQUARE_AND_ADD).interval(timed, timed.level)
