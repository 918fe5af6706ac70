"""What a printed figure may be where there are pairs, person-time, strata, or two printed risks.

Beside its own analysis each form knows the one by which print goes wrong: pairs as if they were not paired, strata as
if they were one table, a rate ratio called a risk ratio.
"""

from __future__ import annotations

from collections.abc import Callable
from dataclasses import dataclass
from functools import partial

from fourcount.appraisal.check.candidate import Candidate, Number, increase, reciprocal, reduction
from fourcount.appraisal.check.unpaired import Reading, turned, unpaired, ways
from fourcount.appraisal.findings.check import Orientation
from fourcount.record.entry.readings import PrintedMeasure
from fourcount.stats import pairs as of_pairs
from fourcount.stats import rates as of_rates
from fourcount.stats import strata as of_strata
from fourcount.stats import timed as of_timed
from fourcount.stats.entries.entry import Method
from fourcount.stats.entries.strata import STRATA_METHODS
from fourcount.stats.entries.timed import TIMED_METHODS
from fourcount.stats.methods import PAIR_METHODS, RATE_METHODS
from fourcount.stats.results import Counts, FractionalCounts, Gap, PairCounts, Rates, TimedRisks

Given = PairCounts | Rates | TimedRisks | tuple[Counts, ...]
ByName = dict[PrintedMeasure, tuple[Reading, ...]]
_TWO: tuple[Orientation, ...] = ("as-read", "groups-swapped")
_FOUR: tuple[Orientation, ...] = ("as-read", "groups-swapped", "other-outcome", "both-swapped")


@dataclass(frozen=True, kw_only=True, slots=True)
class _Form:
    """How one form's measures are called in print, worked out, and seen from other sides."""

    readings: ByName
    estimates: dict[str, Callable[..., Number | Gap]]
    entries: tuple[Method, ...]
    sides: dict[str, tuple[Orientation, ...]]


def paired(pairs: PairCounts, says: PrintedMeasure) -> tuple[Candidate, ...]:
    """Matched pairs, and the same people as if they were not paired."""
    if says == "risk":
        return unpaired(apart(pairs), says)
    unmatched = unpaired(apart(pairs), says)
    return (*_all(_PAIRS, pairs, says, turned_pairs), *_otherwise(unmatched, "unpaired"))


def person_time(rates: Rates, says: PrintedMeasure) -> tuple[Candidate, ...]:
    """Events and person-time of two groups."""
    if says != "risk":
        return _all(_RATES, rates, says, turned_rates)
    groups = (
        ("rate_index", rates.index_events, rates.index_time),
        ("rate_reference", rates.reference_events, rates.reference_time),
    )
    return tuple(
        Candidate(
            measure="rate",
            orientation="as-read",
            named=True,
            estimate=partial(of_rates.rate, events, time),
            ways=ways(RATE_METHODS, "rate", events, time),
            label=label,
        )
        for label, events, time in groups
    )


def stratified(strata: tuple[Counts, ...], crude: Counts, says: PrintedMeasure) -> tuple[Candidate, ...]:
    """Strata pooled, and thrown together."""
    if says == "risk":
        return unpaired(crude, says)
    return (*_all(_STRATA, strata, says, _turned_strata), *_otherwise(unpaired(crude, says), "crude"))


def clustered(counts: Counts, behind: FractionalCounts, says: PrintedMeasure) -> tuple[Candidate, ...]:
    """The counts divided by a design effect, and the same people as if they were in no clusters."""
    return (*unpaired(counts, says, behind), *_otherwise(unpaired(counts, says), "unclustered"))


def discordant(pairs: PairCounts, says: PrintedMeasure) -> tuple[Candidate, ...]:
    """What the discordant pairs give where the others are not known: their odds ratio."""
    return tuple(one for one in _all(_PAIRS, pairs, says, turned_pairs) if one.measure == "pair_odds_ratio")


def timed(risks: TimedRisks, says: PrintedMeasure) -> tuple[Candidate, ...]:
    """Two risks with their printed limits."""
    return _all(_TIMED, risks, says, _turned_timed)


def apart(pairs: PairCounts) -> Counts:
    """The people of pairs as two groups that have nothing to do with each other."""
    return Counts(
        index_events=pairs.both + pairs.index_only,
        index_non_events=pairs.reference_only + pairs.neither,
        reference_events=pairs.both + pairs.reference_only,
        reference_non_events=pairs.index_only + pairs.neither,
    )


def turned_pairs(pairs: PairCounts, side: Orientation) -> PairCounts:
    """The pairs seen from one side: each of both turns exchanges the discordant ones."""
    both, neither = pairs.both, pairs.neither
    index_only, reference_only = pairs.index_only, pairs.reference_only
    if side in ("groups-swapped", "other-outcome"):
        index_only, reference_only = reference_only, index_only
    if side in ("other-outcome", "both-swapped"):
        both, neither = neither, both
    return PairCounts(both=both, index_only=index_only, reference_only=reference_only, neither=neither)


def turned_rates(rates: Rates, side: Orientation) -> Rates:
    """Person-time has no other outcome: only the groups can be swapped."""
    if side == "as-read":
        return rates
    return Rates(
        index_events=rates.reference_events,
        index_time=rates.reference_time,
        reference_events=rates.index_events,
        reference_time=rates.index_time,
    )


def _turned_strata(strata: tuple[Counts, ...], side: Orientation) -> tuple[Counts, ...]:
    return tuple(turned(counts, side) for counts in strata)


def _turned_timed(risks: TimedRisks, side: Orientation) -> TimedRisks:
    if side == "as-read":
        return risks
    return TimedRisks(index=risks.reference, reference=risks.index, level=risks.level)


def _all(form: _Form, given: object, says: PrintedMeasure, turn: Callable[..., object]) -> tuple[Candidate, ...]:
    return tuple(
        Candidate(
            measure=reading.measure,
            orientation=side,
            named=reading.named,
            estimate=partial(form.estimates[reading.measure], seen),
            ways=ways(form.entries, reading.measure, seen),
            seen=reading.seen,
            label=reading.label,
        )
        for reading in form.readings.get(says, ())
        for side in (("as-read",) if reading.seen is reciprocal else form.sides[reading.measure])
        for seen in (turn(given, side),)
    )


def _otherwise(candidates: tuple[Candidate, ...], prefix: str) -> tuple[Candidate, ...]:
    """The analysis that does not belong to this form: never under the print's own name, and only as read or swapped."""
    return tuple(
        Candidate(
            measure=one.measure,
            orientation=one.orientation,
            named=False,
            estimate=one.estimate,
            ways=one.ways,
            seen=one.seen,
            label=f"{prefix}_{one.key}",
            heavy=one.heavy,
        )
        for one in candidates
        if one.named and one.orientation in _TWO and not one.key.startswith("conditional")
    )


def _pair_names() -> ByName:
    ratio, odds = Reading("pair_ratio", True), Reading("pair_odds_ratio", True)
    other_ratio, other_odds = Reading("pair_ratio", False), Reading("pair_odds_ratio", False)
    return {
        "risk_ratio": (ratio, other_odds),
        "odds_ratio": (odds, other_ratio),
        "hazard_ratio": (other_ratio, other_odds),
        "rate_ratio": (other_ratio, other_odds),
        "risk_difference": (Reading("pair_difference", True),),
        "rate_difference": (Reading("pair_difference", False),),
        "relative_reduction": (
            Reading("pair_ratio", True, reduction, "relative_reduction"),
            Reading("pair_ratio", True, increase, "relative_increase"),
        ),
        "number_needed": (Reading("pair_difference", True, reciprocal, "number_needed"),),
    }


_PAIRS = _Form(
    readings=_pair_names(),
    estimates={
        "pair_difference": of_pairs.difference,
        "pair_ratio": of_pairs.ratio,
        "pair_odds_ratio": of_pairs.odds_ratio,
    },
    entries=PAIR_METHODS,
    sides={"pair_difference": _TWO, "pair_ratio": _FOUR, "pair_odds_ratio": _TWO},
)
_OTHER_RATE = (Reading("rate_ratio", False),)
_RATES = _Form(
    readings={
        "rate_ratio": (Reading("rate_ratio", True),),
        "rate_difference": (Reading("rate_difference", True),),
        "risk_ratio": _OTHER_RATE,
        "odds_ratio": _OTHER_RATE,
        "hazard_ratio": _OTHER_RATE,
        "risk_difference": (Reading("rate_difference", False),),
        "relative_reduction": (
            Reading("rate_ratio", True, reduction, "relative_reduction"),
            Reading("rate_ratio", True, increase, "relative_increase"),
        ),
    },
    estimates={"rate_ratio": of_rates.rate_ratio, "rate_difference": of_rates.rate_difference},
    entries=RATE_METHODS,
    sides={"rate_ratio": _TWO, "rate_difference": _TWO},
)
_STRATA = _Form(
    readings={
        "risk_ratio": (Reading("pooled_risk_ratio", True), Reading("pooled_odds_ratio", False)),
        "odds_ratio": (Reading("pooled_odds_ratio", True), Reading("pooled_risk_ratio", False)),
        "hazard_ratio": (Reading("pooled_risk_ratio", False), Reading("pooled_odds_ratio", False)),
        "rate_ratio": (Reading("pooled_risk_ratio", False), Reading("pooled_odds_ratio", False)),
        "risk_difference": (Reading("pooled_risk_difference", True),),
        "relative_reduction": (Reading("pooled_risk_ratio", True, reduction, "relative_reduction"),),
        "number_needed": (Reading("pooled_risk_difference", True, reciprocal, "number_needed"),),
    },
    estimates={
        "pooled_risk_ratio": of_strata.pooled_risk_ratio,
        "pooled_odds_ratio": of_strata.pooled_odds_ratio,
        "pooled_risk_difference": of_strata.pooled_risk_difference,
    },
    entries=STRATA_METHODS,
    sides={"pooled_risk_ratio": _FOUR, "pooled_odds_ratio": _TWO, "pooled_risk_difference": _TWO},
)
_TIMED = _Form(
    readings={
        "risk_ratio": (Reading("timed_ratio", True),),
        "hazard_ratio": (Reading("timed_ratio", False),),
        "rate_ratio": (Reading("timed_ratio", False),),
        "risk_difference": (Reading("timed_difference", True),),
        "relative_reduction": (Reading("timed_ratio", True, reduction, "relative_reduction"),),
        "number_needed": (Reading("timed_difference", True, reciprocal, "number_needed"),),
    },
    estimates={"timed_ratio": of_timed.timed_ratio, "timed_difference": of_timed.timed_difference},
    entries=TIMED_METHODS,
    sides={"timed_ratio": _TWO, "timed_difference": _TWO},
)
