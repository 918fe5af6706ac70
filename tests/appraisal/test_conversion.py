"""Tests of the odds ratio as a risk ratio at a starting risk."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.conversion import converted_figure, mapped
from fourcount.appraisal.findings import Figure, Gap, Interval, Range
from fourcount.stats.conversion import risk_ratio_from_odds_ratio

# Zhang and Yu 1998 (JAMA 280:1690), RR = OR/((1-P0)+P0*OR), evaluated with mpmath 1.4.1 at 50 digits.
FORMULA = [(0.6, 0.906, 0.9410288582183187), (3.0, 0.1, 2.5), (0.5, 0.5, 0.66666666666666667)]


def figure(estimate, low, high):
    """An odds ratio's figure."""
    return Figure(estimate=estimate, interval=Interval(low=low, high=high), method="miettinen-nurminen")


@pytest.mark.parametrize(("odds_ratio", "baseline", "expected"), FORMULA)
def test_the_formula_of_zhang_and_yu(odds_ratio, baseline, expected):
    """Estimate and limits each go through the formula, and the method stays the odds ratio's."""
    converted = converted_figure(figure(odds_ratio, odds_ratio, odds_ratio), baseline)
    assert math.isclose(expected, converted.estimate, rel_tol=1e-14)
    assert math.isclose(expected, converted.interval.low, rel_tol=1e-14)
    assert math.isclose(expected, converted.interval.high, rel_tol=1e-14)
    assert converted.method == "miettinen-nurminen"


@pytest.mark.parametrize(
    ("odds_ratio", "baseline", "expected"), [(4, 0, 4), (4, 1, 1), (1, 0.37, 1), (math.inf, 0.25, 4), (0, 0.3, 0)]
)
def test_the_ends_of_the_formula(odds_ratio, baseline, expected):
    """At 0% the risk ratio is the odds ratio, at 100% it is 1, and an infinite odds ratio means 1/P0 (algebra)."""
    assert expected == converted_figure(figure(odds_ratio, odds_ratio, odds_ratio), baseline).estimate


def test_an_infinite_odds_ratio_at_a_risk_of_0_is_infinite():
    """At a starting risk of 0 an infinite odds ratio stays infinite."""
    assert math.inf == converted_figure(figure(math.inf, 2.0, math.inf), 0.0).interval.high


def test_an_odds_ratio_of_0_says_nothing_where_everybody_has_the_event():
    """At 100% an odds ratio of 0 is undetermined, and a limit of 0 is withheld by itself."""
    converted = converted_figure(figure(0.5, 0.0, 3.0), 1.0)
    assert converted.estimate == 1.0
    assert Range(low=Gap("undetermined-at-baseline"), high=1.0) == converted.interval


# Schwartz, Woloshin, Welch 1999 (NEJM 341:279-283), from memory: referral 84.7% and 78.8% v 90.6%; printed odds
# ratios 0.6 and 0.4, risk ratios 0.93 and 0.87.
@pytest.mark.parametrize(("risk", "odds_ratio", "risk_ratio"), [(847, 0.6, 0.93), (788, 0.4, 0.87)])
def test_at_the_reference_risk_the_conversion_gives_the_risk_ratio(appraised, risk, odds_ratio, risk_ratio):
    """The crude odds ratio at the table's own reference risk is the table's risk ratio, and its figure stands there."""
    findings = appraised(risk, 1000 - risk, 906, 94)
    conversion = findings.conversion
    assert conversion.baseline_from == "reference"
    assert odds_ratio == round(findings.measures["odds_ratio"].estimate, 1)
    assert risk_ratio == round(conversion.risk_ratio.estimate, 2)
    by_formula = risk_ratio_from_odds_ratio(findings.measures["odds_ratio"].estimate, conversion.baseline)
    assert math.isclose(by_formula, conversion.risk_ratio.estimate, rel_tol=1e-12)
    assert findings.measures["risk_ratio"] == conversion.risk_ratio


def test_at_the_own_risk_no_limit_is_converted(appraised):
    """49/50 v 40/50: the converted limits, 1.10 to 1.25, would leave out half of the direct interval."""
    findings = appraised(49, 1, 40, 10)
    converted = converted_figure(findings.measures["odds_ratio"], findings.conversion.baseline).interval
    direct = findings.conversion.risk_ratio.interval
    assert findings.measures["risk_ratio"].interval == direct
    assert converted.high - converted.low < 0.5 * (direct.high - direct.low)


@pytest.mark.parametrize(("cells", "key"), [((0, 10, 0, 20), "no-events"), ((10, 0, 20, 0), "no-non-events")])
def test_without_an_odds_ratio_nothing_is_seen_as_a_risk_ratio(appraised, cells, key):
    """A withheld odds ratio stays withheld as a risk ratio, also where the table has one."""
    found = appraised(*cells).conversion.risk_ratio
    assert (Gap(key), Gap(key)) == (found.estimate, found.interval)


def test_a_typed_starting_risk_is_used(appraised):
    """A typed risk takes the place of the reference group's: the odds ratio 0.492 is 0.524 at 12% (by hand)."""
    conversion = appraised(38, 374, 70, 339, baseline="12%").conversion
    assert (conversion.baseline, conversion.baseline_from) == (0.12, "given")
    odds_ratio = 38 * 339 / (374 * 70)
    assert math.isclose(odds_ratio / (0.88 + 0.12 * odds_ratio), conversion.risk_ratio.estimate, rel_tol=1e-12)
    assert round(conversion.risk_ratio.estimate, 3) == 0.524


def test_an_empty_reference_group_has_no_risk_to_convert_at(appraised):
    """Nobody in the reference group and nothing typed: no starting risk."""
    findings = appraised(3, 7, 0, 0)
    assert Gap("no-starting-risk") == findings.conversion
    assert Gap("no-starting-risk") == findings.patient


def test_a_gap_goes_through_and_a_correction_is_kept():
    """Mapping a figure keeps its gaps, and the name of a correction in use."""
    empty = Figure(estimate=Gap("no-events"), interval=Gap("zero-width"), method="katz")
    assert empty == mapped(empty, lambda value: value)
    adjusted = Figure(estimate=1.0, interval=Interval(low=0.5, high=2.0, adjusted="half"), method="woolf")
    assert mapped(adjusted, lambda value: value).interval.adjusted == "half"


def test_an_interval_without_both_limits_is_a_gap():
    """Where neither limit can be given the interval is the reason itself."""
    beyond = Gap("beyond-one")
    assert beyond == mapped(figure(2.0, 1.5, 3.0), lambda value: beyond).interval
