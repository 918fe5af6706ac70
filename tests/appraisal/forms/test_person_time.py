"""Events and person-time: rates, their difference and ratio. All tables are invented."""

from __future__ import annotations

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import RATE_MEASURES, Gap, Rates
from fourcount.record.outcome import CELLS, Outcome, PersonTime
from fourcount.record.paper import FAMILIES, Choices

TEXTS = ("38", "4,120 person-years", "70", "4,090")


def found(*texts, family="score", **rest):
    """The findings of four texts."""
    table = PersonTime(**dict(zip(CELLS, texts or TEXTS, strict=True)))
    return appraise(Outcome(table=table, **rest), Choices(family=family))


def keys(findings):
    """The keys of the cautions that hold."""
    return {caution.key for caution in findings.cautions}


def test_person_time_gives_rates():
    """38 in 4,120 against 70 in 4,090 person-years."""
    findings = found()
    assert findings.given == Rates(index_events=38, index_time=4120, reference_events=70, reference_time=4090)
    estimates = [findings.measures[key].estimate for key in RATE_MEASURES]
    assert estimates == pytest.approx([38 / 4120, 70 / 4090, 38 / 4120 - 70 / 4090, 38 * 4090 / (70 * 4120)])
    assert Gap("not-counts") == findings.counts
    assert Gap("rates-need-baseline") == findings.patient
    assert findings.test.method == "rate-score"


@pytest.mark.parametrize("family", FAMILIES)
def test_the_other_group_turns_difference_and_ratio(family):
    """The difference changes its sign, the ratio is turned over."""
    one, other = (found(family=family, index_group=group).measures for group in ("first", "second"))
    assert one["rate_difference"].estimate == -other["rate_difference"].estimate
    assert one["rate_ratio"].interval.low == pytest.approx(1 / other["rate_ratio"].interval.high)
    assert one["rate_index"] == other["rate_reference"]


def test_person_time_has_no_other_outcome():
    """Whatever column is said to be counted, the events are."""
    assert found(counted="right") == found()


@pytest.mark.parametrize(
    ("design", "reason"),
    [("survey", "design-no-rates"), ("case-control", "design-no-rates"), ("before-after", "design-needs-pairs")],
)
def test_designs_without_person_time(design, reason):
    """A survey and a case-control study follow nobody; pairs are no two groups."""
    findings = found(design=design)
    assert {figure.key for figure in findings.measures.values()} == {reason}
    assert Gap(reason) == findings.test == findings.patient


def test_zero_person_time_is_a_reason():
    """No time, no rate; a group with some keeps its own."""
    findings = found("0", "0", "70", "4,090")
    assert Gap("no-time") == findings.measures["rate_index"] == findings.measures["rate_ratio"]
    assert findings.measures["rate_reference"].estimate == 70 / 4090
    assert Gap("no-time") == findings.test.p


def test_several_events_of_one_person_are_cautioned():
    """They may be counted here, but are not independent."""
    assert "events-counted" in keys(found(counting="events"))
    assert "events-counted" not in keys(found())
    assert found(counting="events").measures == found().measures


def test_units_that_differ_stop_the_figures():
    """Years against months is no comparison of rates."""
    findings = found("38", "4,120 person-years", "70", "4,090 months")
    assert Gap("unreadable") == findings.given
    assert [mark.key for mark in findings.marks] == ["units-differ"]


def test_a_cohort_has_an_e_value_and_an_attributable_fraction():
    """By the rate ratio, where it is above 1; a trial has neither."""
    findings = found("70", "4,090", "38", "4,120", design="cohort")
    ratio = findings.measures["rate_ratio"].estimate
    assert findings.extras.e_value.measure == "rate_ratio"
    assert findings.extras.attributable_exposed.estimate == pytest.approx((ratio - 1) / ratio)
    assert found(design="cohort").extras.attributable_exposed.key == "ratio-below-one"
    assert found().extras.e_value is None
