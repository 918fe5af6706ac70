"""One invented outcome of every form of print, with findings put together straight from the table of methods.

They are what the words are tested with, apart from how a form is read and appraised.
"""

from __future__ import annotations

from collections.abc import Sequence

from fourcount.appraisal.findings import (
    AnyNumberNeeded,
    Figure,
    Gap,
    Given,
    Homogeneity,
    OutcomeFindings,
    PrintedFigure,
    Probability,
    StrataFindings,
    StratumFindings,
    Totals,
)
from fourcount.record.entry.readings import PrintedNumber
from fourcount.record.outcome import (
    Design,
    EffectOnly,
    Outcome,
    PaperMeasure,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
    form_of,
)
from fourcount.record.outcome import Pairs as PairsTable
from fourcount.stats import estimates, pairs, rates, strata, timed
from fourcount.stats.homogeneity import breslow_day_tarone
from fourcount.stats.methods import FAMILIES, PAIR_FAMILIES, RATE_FAMILIES, method, test
from fourcount.stats.number_needed import number_needed
from fourcount.stats.results import Counts, HomogeneityTest, Interval, LimitedRisk, PairCounts, Rates, TimedRisks

LABELS = {
    "first_label_text": "Night lights",
    "second_label_text": "Usual care",
    "left_words_text": "fell at least once",
    "right_words_text": "did not fall",
    "name_text": "Falls",
    "span_text": "12 months",
}
Measures = dict[str, Figure | AnyNumberNeeded | Gap]


def found(
    outcome: Outcome, given: Given | Gap, measures: Measures, p: Probability | Gap, **more: object
) -> OutcomeFindings:
    """Findings of a form without four counts."""
    nothing = given if isinstance(given, Gap) else Gap("not-counts")
    fields = {"counts": nothing, "conversion": nothing, "patient": Gap("carried-later"), "cautions": (), **more}
    return OutcomeFindings(
        totals=Totals(), marks=(), measures=measures, test=p, form=form_of(outcome.table), given=given, **fields
    )


def pairs_outcome(design: Design = "paired") -> Outcome:
    table = PairsTable(first_left_text="30", first_right_text="20", second_left_text="40", second_right_text="110")
    return Outcome(table=table, design=design, **LABELS)


PAIRS = PairCounts(both=30, index_only=20, reference_only=40, neither=110)


def pairs_found(
    outcome: Outcome, counts: PairCounts = PAIRS, family: str = "score", level: float = 0.95
) -> OutcomeFindings:
    """Every measure of pairs; in a matched case-control study its odds ratio alone."""
    keys = PAIR_FAMILIES[family]

    def figure(measure: str, key: str, estimate: float | Gap) -> Figure:
        return Figure(estimate=estimate, interval=method(measure, key).interval(counts, level), method=key)

    def risk(events: int) -> Figure:
        interval = method("risk", keys.risk).interval(events, counts.total, level)
        return Figure(estimate=estimates.risk(events, counts.total), interval=interval, method=keys.risk)

    difference = figure("pair_difference", keys.difference, pairs.difference(counts))
    needed: AnyNumberNeeded | Gap = Gap("empty-pairs")
    if isinstance(difference.interval, Interval) and not isinstance(difference.estimate, Gap):
        needed = number_needed(difference.estimate, difference.interval, unwelcome=True)
    measures: Measures = {
        "pair_risk_index": risk(counts.both + counts.index_only),
        "pair_risk_reference": risk(counts.both + counts.reference_only),
        "pair_difference": difference,
        "number_needed": needed,
        "pair_ratio": figure("pair_ratio", keys.ratio, pairs.ratio(counts)),
        "pair_odds_ratio": figure("pair_odds_ratio", keys.odds_ratio, pairs.odds_ratio(counts)),
    }
    if outcome.design == "matched":
        measures |= {key: Gap("design-matched") for key in measures if key != "pair_odds_ratio"}
    if outcome.design == "before-after":
        measures["number_needed"] = Gap("design-before-after")
    return found(outcome, counts, measures, Probability(p=test(keys.test).p(counts), method=keys.test))


def rates_outcome(unit: str = "person-years") -> Outcome:
    table = PersonTime(
        first_left_text="38", first_right_text="4,120", second_left_text="70", second_right_text="4,090", unit_text=unit
    )
    return Outcome(table=table, design="cohort", **LABELS)


RATES = Rates(index_events=38, index_time=4120.0, reference_events=70, reference_time=4090.0)


def rates_found(outcome: Outcome, given: Rates = RATES, family: str = "score", level: float = 0.95) -> OutcomeFindings:
    """Both rates, their difference and their ratio."""
    keys = RATE_FAMILIES[family]

    def rate(events: int, time: float) -> Figure:
        interval = method("rate", keys.rate).interval(events, time, level)
        return Figure(estimate=rates.rate(events, time), interval=interval, method=keys.rate)

    def figure(measure: str, key: str, estimate: float | Gap) -> Figure:
        return Figure(estimate=estimate, interval=method(measure, key).interval(given, level), method=key)

    measures: Measures = {
        "rate_index": rate(given.index_events, given.index_time),
        "rate_reference": rate(given.reference_events, given.reference_time),
        "rate_difference": figure("rate_difference", keys.difference, rates.rate_difference(given)),
        "rate_ratio": figure("rate_ratio", keys.ratio, rates.rate_ratio(given)),
    }
    return found(outcome, given, measures, Probability(p=test(keys.test).p(given), method=keys.test))


def timed_outcome() -> Outcome:
    table = RiskAtTime(
        first_left_text="9.2%", first_right_text="6.8 to 12.4", second_left_text="17.1%", second_right_text="13.8-21.1"
    )
    return Outcome(table=table, design="trial", **LABELS)


TIMED = TimedRisks(
    index=LimitedRisk(risk=0.092, low=0.068, high=0.124),
    reference=LimitedRisk(risk=0.171, low=0.138, high=0.211),
    level=0.9,
)


def timed_found(outcome: Outcome, given: TimedRisks = TIMED) -> OutcomeFindings:
    """Two printed risks with the limits of the print, and what follows from them."""

    def risk(limited: LimitedRisk) -> Figure:
        return Figure(estimate=limited.risk, interval=Interval(low=limited.low, high=limited.high), method="printed")

    difference = timed.timed_difference(given)
    interval = timed.square_and_add(given)
    assert isinstance(interval, Interval)
    measures: Measures = {
        "risk_index": risk(given.index),
        "risk_reference": risk(given.reference),
        "risk_difference": Figure(estimate=difference, interval=interval, method="square-and-add"),
        "number_needed": number_needed(difference, interval, unwelcome=True),
        "risk_ratio": Figure(
            estimate=timed.timed_ratio(given), interval=timed.square_and_add_ratio(given), method="square-and-add"
        ),
    }
    return found(outcome, given, measures, Gap("not-counts"))


def effect_outcome(measure: PaperMeasure = "hazard_ratio", adjusted_for: str = "") -> Outcome:
    return Outcome(
        table=EffectOnly(),
        paper_measure=measure,
        paper_text="0.72 (0.55 to 0.92)",
        adjusted_for_text=adjusted_for,
        **LABELS,
    )


def printed_number(text: str) -> PrintedNumber:
    return PrintedNumber(text=text, value=float(text), decimals=len(text.partition(".")[2]))


def effect_found(
    outcome: Outcome, limits: tuple[str, str, str] = ("0.72", "0.55", "0.92"), scale: float = 1.0, **more: object
) -> OutcomeFindings:
    """The printed measure alone; ``scale`` turns the print's unit into a fraction."""
    estimate, low, high = map(printed_number, limits)
    printed = PrintedFigure(
        measure=outcome.paper_measure, text=outcome.paper_text, estimate=estimate, low=low, high=high, **more
    )
    interval = Interval(low=low.value * scale, high=high.value * scale)
    figure = Figure(estimate=estimate.value * scale, interval=interval, method="printed")
    return found(outcome, printed, {printed.measure: figure}, Gap("not-counts"))


def strata_outcome(design: Design = "cohort") -> Outcome:
    rows = (("under 65", 10, 200, 22, 190), ("65 and over", 28, 212, 48, 219))
    table = Strata(
        strata=tuple(
            Stratum(
                label_text=label,
                first_left_text=str(a),
                first_right_text=str(n1),
                second_left_text=str(c),
                second_right_text=str(n2),
            )
            for label, a, n1, c, n2 in rows
        )
    )
    return Outcome(table=table, design=design, **LABELS)


STRATA = (
    Counts(index_events=10, index_non_events=190, reference_events=22, reference_non_events=168),
    Counts(index_events=28, index_non_events=184, reference_events=48, reference_non_events=171),
)


def measures_of(counts: Counts, family: str = "score", level: float = 0.95) -> Measures:
    """The measures of one table of four counts that strata show."""
    keys = FAMILIES[family]

    def figure(measure: str, key: str, estimate: float | Gap) -> Figure:
        return Figure(estimate=estimate, interval=method(measure, key).interval(counts, level), method=key)

    def risk(events: int, total: int) -> Figure:
        interval = method("risk", keys.risk).interval(events, total, level)
        return Figure(estimate=estimates.risk(events, total), interval=interval, method=keys.risk)

    difference = figure("risk_difference", keys.risk_difference, estimates.risk_difference(counts))
    needed: AnyNumberNeeded | Gap = Gap("empty-table")
    if isinstance(difference.interval, Interval) and not isinstance(difference.estimate, Gap):
        needed = number_needed(difference.estimate, difference.interval, unwelcome=True)
    ratio = figure("risk_ratio", keys.risk_ratio, estimates.risk_ratio(counts))
    index, reference = (
        risk(counts.index_events, counts.index_total),
        risk(counts.reference_events, counts.reference_total),
    )
    return {
        "risk_index": index,
        "risk_reference": reference,
        "odds_index": index,
        "odds_reference": reference,
        "risk_difference": difference,
        "number_needed": needed,
        "risk_ratio": ratio,
        "other_risk_ratio": ratio,
        "odds_ratio": figure("odds_ratio", keys.odds_ratio, estimates.odds_ratio(counts)),
    }


def strata_found(
    outcome: Outcome, several: Sequence[Counts] = STRATA, parting: tuple[str, ...] = (), level: float = 0.95
) -> OutcomeFindings:
    """Crude measures of all strata thrown together, the pooled ones, and each stratum's own."""
    crude = Counts(
        index_events=sum(t.index_events for t in several),
        index_non_events=sum(t.index_non_events for t in several),
        reference_events=sum(t.reference_events for t in several),
        reference_non_events=sum(t.reference_non_events for t in several),
    )
    pooled = {
        measure: Figure(estimate=estimate(several), interval=method(measure, key).interval(several, level), method=key)
        for measure, key, estimate in (
            ("pooled_risk_difference", "sato", strata.pooled_risk_difference),
            ("pooled_risk_ratio", "greenland-robins", strata.pooled_risk_ratio),
            ("pooled_odds_ratio", "robins-breslow-greenland", strata.pooled_odds_ratio),
        )
    }
    together = breslow_day_tarone(several)
    homogeneity: Homogeneity | Gap
    if isinstance(together, HomogeneityTest):
        homogeneity = Homogeneity(
            method="breslow-day-tarone", chi_square=together.chi_square, degrees=together.degrees, p=together.p
        )
    else:
        homogeneity = together
    rows = outcome.table.strata if isinstance(outcome.table, Strata) else ()
    labels = [row.label_text for row in rows]
    cmh = Probability(p=test("cmh").p(several), method="cmh")
    beside = StrataFindings(
        strata=tuple(
            StratumFindings(label=label, counts=counts, measures=measures_of(counts))
            for label, counts in zip(labels, several, strict=True)
        ),
        pooled=pooled,
        test=cmh,
        homogeneity=homogeneity,
        parting=parting,
    )
    return found(outcome, crude, measures_of(crude), cmh, counts=crude, strata=beside)
