"""Which choices of the record make its own figures the paper's. All tables are invented."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.check import check, check_figures
from fourcount.appraisal.check.basis import of_pairs, of_rates
from fourcount.appraisal.findings import Figure, Interval
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.stats.methods import method
from fourcount.stats.results import PairCounts, Rates
from printed_figures import printed

SMALL = (7, 27, 1, 33)


@pytest.mark.parametrize(
    ("text", "adopt"),
    [
        ("RR 7.00 (0.91 to 53.9)", ("textbook", 0.95)),
        ("RR 7.00 (90% CI, 1.26 to 38.8)", ("textbook", 0.90)),
        ("RR 7.00 (1.21 to 43.0)", ("score", 0.95)),
        ("OR 8.56 (0.97 to 397)", ("exact", 0.95)),
        ("RR 8.56 (0.97 to 397)", ("exact", 0.95)),
        ("RR 7.00 (1.22 to 42.6)", None),  # Koopman's, which no family shows
        ("RR 7.00", None),  # no limits, so nothing is told
        ("RR 0.14 (0.02 to 1.10)", None),  # the other way round
    ],
)
def test_the_family_and_level_that_give_the_print(
    study: Callable[..., Outcome], text: str, adopt: tuple[str, float] | None
) -> None:
    """Told by the limits alone; the figures shown under them are the paper's."""
    outcome = study(*SMALL, paper_text=text)
    found = check(outcome, Choices())
    assert found.adopt == adopt
    if adopt is None:
        return
    match = next(one for one in found.figures[0].matches if one.fit == "all" and one.level == adopt[1])
    shown: Any = appraise(outcome, Choices(family=adopt[0], level=adopt[1])).measures[match.measure]  # type: ignore[arg-type]
    assert isinstance(shown, Figure)
    assert isinstance(shown.interval, Interval)
    matched = [one.computed for one in found.figures[0].matches if one.method == shown.method]
    assert (shown.estimate, shown.interval.low, shown.interval.high) in matched


def test_the_records_own_family_is_kept_where_it_does(study: Callable[..., Outcome]) -> None:
    """Several families fit: the record's own, else the textbook's."""
    outcome = study(38, 374, 70, 339, paper_text="RR 0.54 (0.37 to 0.78)")
    assert check(outcome, Choices(family="score")).adopt == ("score", 0.95)
    assert check(outcome, Choices(family="textbook")).adopt == ("textbook", 0.95)
    both = study(38, 374, 70, 339, paper_text="RD -7.9 percentage points (-12.5 to -3.3)")
    assert check(both, Choices(family="score")).adopt == ("textbook", 0.95)


def test_two_figures_have_to_agree(study: Callable[..., Outcome]) -> None:
    """Limits of two families in one text leave no family that gives both."""
    text = "RR 7.00 (0.91 to 53.9); OR 8.56 (0.97 to 397)"
    assert check(study(*SMALL, paper_text=text), Choices()).adopt is None


def test_pairs_and_rates_have_families_too() -> None:
    """Wald's for pairs and the log interval of a rate ratio are the textbook family's."""
    pairs = PairCounts(both=12, index_only=25, reference_only=10, neither=53)
    wald: Any = method("pair_difference", "wald").interval(pairs, 0.95)
    figure = printed("risk_difference", "0.150", f"{wald.low:.4f}", f"{wald.high:.4f}")
    assert check_figures((figure,), of_pairs(pairs), Choices()).adopt == ("textbook", 0.95)
    rates = Rates(index_events=3, index_time=41.0, reference_events=9, reference_time=40.0)
    log: Any = method("rate_ratio", "log").interval(rates, 0.95)
    figure = printed("rate_ratio", "0.325", f"{log.low:.4f}", f"{log.high:.4f}")
    assert check_figures((figure,), of_rates(rates), Choices()).adopt == ("textbook", 0.95)
