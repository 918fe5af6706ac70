"""The check of pairs, person-time, strata and risks at a time. All figures are invented."""

from __future__ import annotations

from collections.abc import Callable

import pytest

from fourcount.appraisal.check import check, check_figures
from fourcount.appraisal.check.basis import Basis, of_pairs, of_rates, of_strata, of_timed
from fourcount.appraisal.check.other_forms import apart, turned_pairs, turned_rates
from fourcount.appraisal.findings import FigureCheck
from fourcount.record.entry.readings import PrintedFigure
from fourcount.record.outcome import (
    EffectOnly,
    EventsAndOthers,
    Outcome,
    Pairs,
    PercentOfTotal,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
)
from fourcount.record.paper import Choices
from fourcount.stats import pairs as paired
from fourcount.stats import rates as of_time
from fourcount.stats.methods import PAIR_TESTS, RATE_TESTS, method
from fourcount.stats.results import Counts, Interval, LimitedRisk, PairCounts, Rates, TimedRisks
from printed_figures import printed
from tables import counts_of

PAIRS = PairCounts(both=12, index_only=25, reference_only=10, neither=53)
RATES = Rates(index_events=38, index_time=4120.0, reference_events=70, reference_time=4090.0)
STRATA = (counts_of((10, 90, 20, 180)), counts_of((40, 60, 15, 35)))
TIMED = TimedRisks(
    index=LimitedRisk(risk=0.09, low=0.06, high=0.12),
    reference=LimitedRisk(risk=0.17, low=0.13, high=0.21),
    level=0.95,
)


def crude() -> Counts:
    return counts_of((50, 150, 35, 215))


def of(figure: PrintedFigure, basis: Basis) -> FigureCheck:
    return check_figures((figure,), basis, Choices()).figures[0]


def texts(interval: object, estimate: object, scale: int = 1, decimals: int = 3) -> tuple[str, str, str]:
    assert isinstance(interval, Interval)
    assert isinstance(estimate, float)
    low, middle, high = (f"{x * scale:.{decimals}f}" for x in (interval.low, estimate, interval.high))
    return middle, low, high


@pytest.mark.parametrize(
    ("says", "measure", "key", "estimate"),
    [
        ("risk_difference", "pair_difference", "newcombe", paired.difference),
        ("risk_difference", "pair_difference", "tango", paired.difference),
        ("risk_difference", "pair_difference", "wald", paired.difference),
        ("risk_ratio", "pair_ratio", "bonett-price", paired.ratio),
        ("risk_ratio", "pair_ratio", "log", paired.ratio),
        ("odds_ratio", "pair_odds_ratio", "conditional-exact", paired.odds_ratio),
        ("odds_ratio", "pair_odds_ratio", "conditional-mid-p", paired.odds_ratio),
        ("odds_ratio", "pair_odds_ratio", "log", paired.odds_ratio),
    ],
)
def test_each_method_of_pairs_is_known(
    says: str, measure: str, key: str, estimate: Callable[[PairCounts], object]
) -> None:
    """The limits of each are told as that method's."""
    figure = printed(says, *texts(method(measure, key).interval(PAIRS, 0.95), estimate(PAIRS)))
    found = of(figure, of_pairs(PAIRS))
    assert found.findings[0].key == "reproduced"
    assert found.findings[0].facts["methods"] == key


def test_an_unmatched_odds_ratio_of_matched_pairs() -> None:
    """The odds ratio of the margins, Woolf's limits: pairs analysed as if they were not paired."""
    people = apart(PAIRS)
    woolf = method("odds_ratio", "woolf").interval(people, 0.95)
    value = people.index_events * people.reference_non_events / people.index_non_events / people.reference_events
    found = of(printed("odds_ratio", *texts(woolf, value)), of_pairs(PAIRS))
    assert found.findings[0].key == "other-analysis"
    assert found.findings[0].facts["measure"] == "unpaired_odds_ratio"


@pytest.mark.parametrize("test", PAIR_TESTS, ids=lambda test: test.key)
def test_each_test_of_pairs_is_known(test: object) -> None:
    """McNemar's in all its ways."""
    figure = printed("odds_ratio", "2.50", p=f"{test.p(PAIRS):.6f}")  # type: ignore[attr-defined]
    (finding,) = [one for one in of(figure, of_pairs(PAIRS)).findings if one.key == "p-reproduced"]
    assert finding.facts["tests"] == test.key  # type: ignore[attr-defined]


@pytest.mark.parametrize("key", ["exact", "mid-p", "score", "log"])
def test_each_method_of_a_rate_ratio_is_known(key: str) -> None:
    """Also where it is called a hazard ratio, which no table gives, but which it may fit as well."""
    middle, low, high = texts(method("rate_ratio", key).interval(RATES, 0.95), of_time.rate_ratio(RATES))
    found = of(printed("rate_ratio", middle, low, high), of_rates(RATES))
    assert (found.findings[0].key, found.findings[0].facts["methods"]) == ("reproduced", key)
    other = of(printed("hazard_ratio", middle, low, high), of_rates(RATES))
    assert other.findings[0].key == "no-hazard-ratio"
    assert other.findings[0].facts["fits"] == 1


def test_a_rate_difference_per_1000() -> None:
    """So many per 1,000 of the unit of time."""
    wald = method("rate_difference", "wald").interval(RATES, 0.95)
    figure = printed("rate_difference", *texts(wald, of_time.rate_difference(RATES), 1000), unit="per-1000")
    assert of(figure, of_rates(RATES)).findings[0].key == "reproduced"


def test_a_printed_rate() -> None:
    """38 in 4,120 is 9.2 per 1,000."""
    found = of(printed("risk", "9.2", unit="per-1000"), of_rates(RATES))
    assert found.findings[0].facts["measure"] == "rate_index"


@pytest.mark.parametrize("test", RATE_TESTS, ids=lambda test: test.key)
def test_each_test_of_rates_is_known(test: object) -> None:
    """Its p, to six decimals."""
    figure = printed("rate_ratio", "0.54", p=f"{test.p(RATES):.7f}")  # type: ignore[attr-defined]
    (finding,) = [one for one in of(figure, of_rates(RATES)).findings if one.key == "p-reproduced"]
    assert test.key in str(finding.facts["tests"])  # type: ignore[attr-defined]


def test_pooled_and_crude_strata_are_told_apart() -> None:
    """The pooled odds ratio is the strata's own; the crude one is told by another name."""
    from fourcount.stats.strata import pooled_odds_ratio

    basis = of_strata(STRATA, crude())
    pooled = method("pooled_odds_ratio", "robins-breslow-greenland").interval(STRATA, 0.95)
    found = of(printed("odds_ratio", *texts(pooled, pooled_odds_ratio(STRATA))), basis)
    assert (found.findings[0].key, found.findings[0].facts["measure"]) == ("reproduced", "pooled_odds_ratio")
    woolf = method("odds_ratio", "woolf").interval(crude(), 0.95)
    found = of(printed("odds_ratio", *texts(woolf, 50 * 215 / 150 / 35)), basis)
    assert (found.findings[0].key, found.findings[0].facts["measure"]) == ("other-analysis", "crude_odds_ratio")


def test_risks_at_a_time() -> None:
    """A difference squared and added from the printed limits."""
    interval = method("timed_difference", "square-and-add").interval(TIMED, 0.95)
    figure = printed("risk_difference", *texts(interval, -0.08, 100, 1), unit="percent")
    found = of(figure, of_timed(TIMED))
    assert (found.findings[0].key, found.findings[0].facts["methods"]) == ("reproduced", "square-and-add")


def test_turning_twice_is_turning_back() -> None:
    """Each side of pairs and of rates is its own inverse, and the paired odds ratio turns to its reciprocal."""
    for side in ("groups-swapped", "other-outcome", "both-swapped"):
        assert turned_pairs(turned_pairs(PAIRS, side), side) == PAIRS  # type: ignore[arg-type]
    assert turned_rates(turned_rates(RATES, "groups-swapped"), "groups-swapped") == RATES
    assert paired.odds_ratio(turned_pairs(PAIRS, "other-outcome")) == pytest.approx(0.4)


def said(outcome: Outcome) -> list[str]:
    return [finding.key for finding in check(outcome, Choices()).figures[0].findings]


def test_clusters_taken_into_account_or_not() -> None:
    """Katz's limits from the counts divided by a design effect of 1.48, and those of people in no clusters."""
    cells = {"first_left_text": "38", "first_right_text": "374", "second_left_text": "70", "second_right_text": "339"}

    def outcome(text: str) -> Outcome:
        return Outcome(table=EventsAndOthers(**cells), icc_text="0.02", cluster_size_text="25", paper_text=text)

    assert said(outcome("RR 0.54 (0.34 to 0.85)")) == ["reproduced"]
    naive = outcome("RR 0.54 (0.37 to 0.78)")
    assert said(naive) == ["other-analysis"]
    assert check(naive, Choices()).adopt is None
    unknown = Outcome(table=EventsAndOthers(**cells), cluster_size_text="25", paper_text="RR 0.54 (0.37 to 0.78)")
    assert said(unknown) == ["reproduced"]
    assert check(unknown, Choices()).adopt is None  # the window withholds intervals there


def test_discordant_pairs_alone() -> None:
    """Their odds ratio is checked where no others are typed, whichever side is the index side."""
    table = Pairs(first_right_text="25", second_left_text="10")
    for side, text in (("first", "OR 2.5 (1.20 to 5.21)"), ("second", "OR 0.40 (0.19 to 0.83)")):
        outcome = Outcome(design="matched", table=table, index_group=side, paper_text=text)  # type: ignore[arg-type]
        assert said(outcome) == ["reproduced"]
        assert check(outcome, Choices()).adopt == ("textbook", 0.95)


def test_every_form_is_checked_as_typed() -> None:
    """From cells to sentences: person-time, strata, risks at a time, and an effect without counts."""
    rates = PersonTime(
        first_left_text="38",
        first_right_text="4120",
        second_left_text="70",
        second_right_text="4090",
        unit_text="years",
    )
    assert said(Outcome(table=rates, paper_text="rate ratio 0.54 (0.36 to 0.80)")) == ["reproduced"]
    row = {"first_left_text": "10", "first_right_text": "100", "second_left_text": "20", "second_right_text": "200"}
    other = {"first_left_text": "40", "first_right_text": "100", "second_left_text": "15", "second_right_text": "50"}
    strata = Strata(strata=(Stratum(**row), Stratum(**other)))
    assert said(Outcome(table=strata, paper_text="OR 2.05 (1.27 to 3.30)"))[0] == "other-analysis"
    timed = RiskAtTime(first_left_text="9% (6 to 12)", second_left_text="17% (13 to 21)")
    assert said(Outcome(table=timed, paper_text="RD -8.0 percentage points (-13.0 to -3.0)")) == ["reproduced"]
    effect = Outcome(table=EffectOnly(), paper_text="HR 0.72 (0.55 to 0.94), P = 0.02")
    assert said(effect) == ["symmetric", "p-from-limits"]


def test_percentages_that_fit_several_counts() -> None:
    """9% of 412 may be 35 to 39: the nearest, 37, does not give the print, and 38 does; it is said, nothing adopted."""
    table = PercentOfTotal(
        first_left_text="9%", first_right_text="412", second_left_text="17%", second_right_text="409"
    )
    found = check(Outcome(table=table, paper_text="RR 0.539 (0.372 to 0.781)"), Choices())
    assert [finding.key for finding in found.figures[0].findings] == ["reproduced"]
    (finding,) = found.cells
    assert (finding.key, finding.facts["first"], finding.facts["second"]) == ("other-counts", 38, 70)
    assert finding.facts["first_taken"] == 37
    assert found.adopt is None
    unfit = check(Outcome(table=table, paper_text="RR 0.70 (0.41 to 0.99)"), Choices())
    assert unfit.cells == ()
