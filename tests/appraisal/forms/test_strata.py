"""Strata: crude beside pooled, and when they part. All tables are invented unless a test names a source."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import MEASURES, POOLED_MEASURES, Counts, Figure, Gap, Interval
from fourcount.record.outcome import Outcome, Patient, Strata, Stratum
from fourcount.record.paper import FAMILIES, Choices

CONFOUNDED = ((8, 12, 64, 96), (16, 144, 2, 18))
"""Risks of 40% in both groups of the one stratum and of 10% in both of the other, in very different numbers."""

ALIKE = ((10, 90, 20, 80), (3, 47, 9, 31))
ODD_ODDS = ((90, 10, 50, 50), (50, 50, 10, 90))
"""Groups of one size everywhere: an odds ratio of 9 in both strata and of 5.4 crude, without any confounding."""


def outcome(rows, *, baseline="", effect="risk_ratio", labels=(), **rest):
    """An outcome of several rows of four counts."""
    labels = (*labels, *[""] * len(rows))
    strata = tuple(
        Stratum(
            label_text=label,
            first_left_text=str(row[0]),
            first_right_text=str(row[1]),
            second_left_text=str(row[2]),
            second_right_text=str(row[3]),
        )
        for row, label in zip(rows, labels, strict=False)
    )
    patient = Patient(starting_risk_text=baseline, effect=effect)
    return Outcome(table=Strata(strata=strata, of_total=False), patient=patient, **rest)


def found(rows, family="score", **rest):
    """The findings of several rows."""
    return appraise(outcome(rows, **rest), Choices(family=family))


def facts(findings):
    """The facts of the cautions by key, in lists."""
    told = {}
    for caution in findings.cautions:
        told.setdefault(caution.key, []).append(caution.facts)
    return told


def test_all_strata_together_are_the_crude_table():
    """The sums are the counts, and every measure of a table of four counts is there."""
    findings = found(ALIKE)
    total = Counts(index_events=13, index_non_events=137, reference_events=29, reference_non_events=111)
    assert findings.counts == findings.given == total
    assert tuple(findings.measures) == MEASURES
    assert (findings.totals.first_left, findings.totals.everyone) == (13, 290)


@pytest.mark.parametrize("family", FAMILIES)
def test_pooled_measures_are_the_same_in_every_family(family):
    """They are asymptotic in all of them, and so are their tests."""
    strata, score = found(ALIKE, family).strata, found(ALIKE).strata
    assert (strata.pooled, strata.test, strata.homogeneity) == (score.pooled, score.test, score.homogeneity)
    assert {figure.method for figure in strata.pooled.values()} == {
        "sato", "greenland-robins", "robins-breslow-greenland",
    }  # fmt: skip
    assert (strata.test.method, strata.homogeneity.method) == ("cmh", "breslow-day-tarone")


def test_each_stratum_has_its_own_figures():
    """Under its label or the number of its row; blank rows are left out."""
    blank = ("", "", "", "")
    strata = found((ALIKE[0], blank, ALIKE[1]), labels=("under 65", "", "")).strata.strata
    assert [stratum.label for stratum in strata] == ["under 65", "3"]
    assert strata[0].measures["risk_ratio"].estimate == 0.5
    assert isinstance(strata[1].measures["odds_ratio"].interval, Interval)


def test_confounding_parts_crude_from_pooled():
    """Equal risks in both strata pool to no effect, while all together show one; both sides are said."""
    findings = found(CONFOUNDED, design="cohort")
    assert findings.strata.pooled["pooled_risk_ratio"].estimate == pytest.approx(1)
    assert findings.strata.pooled["pooled_risk_difference"].estimate == pytest.approx(0)
    assert set(findings.strata.parting) == {"pooled_risk_difference", "pooled_risk_ratio", "pooled_odds_ratio"}
    told = facts(findings)
    assert [one["measure"] for one in told["strata-part"]] == ["risk_difference", "risk_ratio"]
    assert told["strata-part"][1]["crude"] == pytest.approx((24 / 180) / (66 / 180))
    assert "strata-odds-ratio-parts" not in told


def test_an_odds_ratio_alone_may_part_without_confounding():
    """Difference and risk ratio agree, crude and pooled; the odds ratio's caution is its own."""
    findings = found(ODD_ODDS)
    assert findings.strata.parting == ("pooled_odds_ratio",)
    (told,) = facts(findings)["strata-odds-ratio-parts"]
    assert told == {"measure": "odds_ratio", "crude": pytest.approx(49 / 9), "pooled": pytest.approx(9)}
    assert "strata-part" not in facts(findings)


def test_a_tenth_is_the_border():
    """Crude and pooled that differ by less are not said to part."""
    assert found(ALIKE).strata.parting == ()
    assert {"strata-part", "strata-odds-ratio-parts"}.isdisjoint(facts(found(ALIKE)))


def test_swapping_the_groups_parts_the_same_measures():
    """Which group is the index group decides nothing."""
    for rows in (CONFOUNDED, ALIKE, ODD_ODDS):
        one, other = (found(rows, index_group=group).strata.parting for group in ("first", "second"))
        assert one == other


def test_unlike_strata_are_said():
    """A benefit in one stratum and a harm in the other are not one effect."""
    findings = found(((10, 90, 30, 70), (30, 70, 10, 90)))
    assert findings.strata.homogeneity.p < 0.001
    assert facts(findings)["strata-unlike"] == [{"p": findings.strata.homogeneity.p}]
    assert "strata-unlike" not in facts(found(ALIKE))


def test_strata_of_a_few_people_are_said():
    """Where over a fifth of those that tell something expect under 5 in a cell; 10 v 10 with 10 events expect 5."""
    even = (5, 5, 5, 5)
    assert "strata-small" not in facts(found((even, even)))
    assert facts(found((even, (4, 5, 5, 5))))["strata-small"] == [{"small": 1, "strata": 2}]
    assert "strata-small" not in facts(found((*[even] * 4, (4, 5, 5, 5))))
    nothing = (0, 3, 0, 3)
    assert "strata-small" not in facts(found((even, even, nothing)))


@pytest.mark.parametrize("family", FAMILIES)
def test_two_strata_are_set_against_each_other(family):
    """By the error of each textbook interval, whatever the family (Altman and Bland 2003); Woolf's by hand."""
    found_apart = found(ALIKE, family).strata.interactions
    odds = found_apart["pooled_odds_ratio"]
    ratios = (10 * 80 / (90 * 20), 3 * 31 / (47 * 9))
    error = sum(1 / count for row in ALIKE for count in row) ** 0.5
    assert odds.figure.estimate == pytest.approx(ratios[0] / ratios[1])
    assert odds.figure.interval.high == pytest.approx(ratios[0] / ratios[1] * math.exp(1.959963985 * error))
    assert odds.p == pytest.approx(math.erfc(abs(math.log(ratios[0] / ratios[1])) / error / 2**0.5))
    assert found_apart["pooled_risk_difference"].figure.estimate == pytest.approx(-0.1 - (3 / 50 - 9 / 40))


def test_more_strata_or_fewer_have_no_one_interaction():
    """Nor what the design or clusters withhold, nor what has no logarithm."""
    assert found(ALIKE[:1]).strata.interactions == found((*ALIKE, ALIKE[0])).strata.interactions == {}
    assert list(found(ALIKE, design="case-control").strata.interactions) == ["pooled_odds_ratio"]
    zero = found((ALIKE[0], (0, 50, 9, 31))).strata.interactions
    assert Gap("not-positive") == zero["pooled_risk_ratio"] == zero["pooled_odds_ratio"]
    clustered = found(ALIKE, icc_text="0.05", cluster_size_text="20").strata.interactions
    assert clustered == dict.fromkeys(POOLED_MEASURES, Gap("clusters-not-here"))


def test_strata_are_no_studies():
    """Said of two strata and more; one has nothing to pool or to agree with."""
    assert facts(found(ALIKE))["no-meta-analysis"] == [{"strata": 2}]
    one = found(ALIKE[:1])
    assert "no-meta-analysis" not in facts(one)
    assert isinstance(one.strata.homogeneity, Gap)
    assert one.strata.pooled["pooled_risk_ratio"].estimate == pytest.approx(one.measures["risk_ratio"].estimate)


def test_a_case_control_study_pools_its_odds_ratio_only():
    """The other measures are withheld, crude, pooled and in every stratum."""
    strata = found(ALIKE, design="case-control").strata
    assert Gap("design-case-control") == strata.pooled["pooled_risk_ratio"] == strata.strata[0].measures["risk_ratio"]
    assert isinstance(strata.pooled["pooled_odds_ratio"], Figure)


@pytest.mark.parametrize("rest", [{"design": "paired"}, {"counting": "events"}])
def test_what_four_counts_refuse_strata_refuse(rest):
    """Pairs and events are no people of two groups."""
    findings = found(ALIKE, **rest)
    assert isinstance(findings.strata, Gap)
    assert findings.measures == dict.fromkeys(MEASURES, findings.strata)
    assert findings.test == findings.patient == findings.strata


def test_a_patient_takes_the_pooled_effect():
    """At a typed starting risk; each stratum has its own, so none is taken from the table."""
    for effect in ("risk_ratio", "odds_ratio"):
        findings = found(CONFOUNDED, baseline="20%", effect=effect)
        assert findings.patient.carried == findings.strata.pooled[f"pooled_{effect}"]
        assert findings.patient.with_.estimate == pytest.approx(0.2)
        assert findings.patient.range_from == "effect"
    assert findings.conversion.risk_ratio.estimate == pytest.approx(1)
    assert Gap("strata-need-baseline") == found(CONFOUNDED).patient == found(CONFOUNDED).conversion
    assert Gap("baseline-unreadable") == found(CONFOUNDED, baseline="often").patient


def test_rows_that_are_not_whole_stop_the_figures():
    """A cell that cannot be read outweighs one that is empty; the mark names its row."""
    assert Gap("strata-not-typed") == found((ALIKE[0], ("3", "", "", ""))).given
    findings = found((ALIKE[0], ("3", "", "", ""), ("x", "1", "2", "3")))
    assert Gap("unreadable") == findings.given == findings.strata
    assert [mark.field for mark in findings.marks] == ["strata.2.first_left_text"]
    assert Gap("strata-not-typed") == found(()).given == found((("", "", "", ""),)).given


def test_empty_strata_are_reasons():
    """Nobody anywhere leaves nothing to pool; an empty stratum beside another does no harm."""
    nobody = found(((0, 0, 0, 0), (0, 0, 0, 0)))
    assert all(isinstance(figure, Gap) for figure in nobody.strata.pooled.values())
    beside = found((*ALIKE, (0, 0, 0, 0))).strata.pooled
    assert beside["pooled_risk_ratio"].estimate == found(ALIKE).strata.pooled["pooled_risk_ratio"].estimate


def test_clusters_leave_strata_without_intervals():
    """The estimates stand, crude and pooled."""
    findings = found(ALIKE, icc_text="0.05", cluster_size_text="20")
    assert Gap("clusters-not-here") == findings.measures["risk_ratio"].interval
    assert Gap("clusters-not-here") == findings.strata.pooled["pooled_risk_ratio"].interval
    assert Gap("clusters-not-here") == findings.strata.test.p
    assert "cluster-uncorrected" in facts(findings)


def test_a_cohorts_e_value_is_of_the_pooled_ratio():
    """The strata have dealt with what they are strata of."""
    findings = found(ALIKE, design="cohort")
    ratio = 1 / findings.strata.pooled["pooled_risk_ratio"].estimate
    assert findings.extras.e_value.estimate == pytest.approx(ratio + (ratio * (ratio - 1)) ** 0.5)


OPPOSED = ((10, 190, 30, 270), (15, 85, 12, 38), (60, 40, 5, 5))
"""Crude 8 more in 100, within the strata 5 fewer."""


def test_the_number_needed_is_that_of_the_pooled_difference():
    """Where crude and pooled point opposite ways, it goes with the pooled one, interval included."""
    findings = found(OPPOSED)
    pooled, needed = findings.strata.pooled["pooled_risk_difference"], findings.measures["number_needed"]
    assert findings.measures["risk_difference"].estimate > 0 > pooled.estimate
    assert needed.estimate == pytest.approx(-1 / pooled.estimate)
    assert needed.kind == "NNTB"
    assert needed.through_infinity == (pooled.interval.low < 0 < pooled.interval.high)


def test_a_number_that_the_design_withholds_is_not_pooled_either():
    """A survey has none, and neither have people followed for different times."""
    assert found(OPPOSED, design="survey").measures["number_needed"] == Gap("design-survey-nnt")
    assert isinstance(found(OPPOSED, follow_up_varied=True).measures["number_needed"], Gap)
