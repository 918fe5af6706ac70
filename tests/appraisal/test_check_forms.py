"""The check of pairs, person-time, strata and risks at a time. All figures are invented."""

from __future__ import annotations

from collections.abc import Callable

import pytest

from fourcount.appraisal.check import check_figures
from fourcount.appraisal.check.basis import Basis, of_pairs, of_rates, of_strata, of_timed
from fourcount.appraisal.check.other_forms import apart, turned_pairs, turned_rates
from fourcount.appraisal.findings import FigureCheck
from fourcount.record.entry.readings import PrintedFigure
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
    assert found.findings[0].key == "other-name"
    assert found.findings[0].facts["measure"] == "unpaired_odds_ratio"


@pytest.mark.parametrize("test", PAIR_TESTS, ids=lambda test: test.key)
def test_each_test_of_pairs_is_known(test: object) -> None:
    """McNemar's in all its ways."""
    figure = printed("odds_ratio", "2.50", p=f"{test.p(PAIRS):.6f}")  # type: ignore[attr-defined]
    (finding,) = [one for one in of(figure, of_pairs(PAIRS)).findings if one.key == "p-reproduced"]
    assert finding.facts["tests"] == test.key  # type: ignore[attr-defined]


@pytest.mark.parametrize("key", ["exact", "mid-p", "score", "log"])
def test_each_method_of_a_rate_ratio_is_known(key: str) -> None:
    """Also where it is called a hazard ratio, which then is a question of the name."""
    middle, low, high = texts(method("rate_ratio", key).interval(RATES, 0.95), of_time.rate_ratio(RATES))
    found = of(printed("rate_ratio", middle, low, high), of_rates(RATES))
    assert (found.findings[0].key, found.findings[0].facts["methods"]) == ("reproduced", key)
    other = of(printed("hazard_ratio", middle, low, high), of_rates(RATES))
    assert [finding.key for finding in other.findings] == ["other-name", "no-hazard-ratio"]


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
    assert (found.findings[0].key, found.findings[0].facts["measure"]) == ("other-name", "crude_odds_ratio")


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
