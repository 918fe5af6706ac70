"""What a reader says beside four counts: clusters, losses, follow-up, events; and what then stands under the fold."""

from __future__ import annotations

import pytest
from msgspec import structs

from forms import at_time, of_total, paired, person_time, strata
from fourcount.appraisal import appraise as module
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import (
    MEASURES,
    Clusters,
    Figure,
    Fragility,
    Gap,
    Interval,
    NumberNeeded,
    OutcomeFindings,
)
from fourcount.appraisal.waiting import waits
from fourcount.record.paper import FAMILIES, Choices

TABLE = (38, 374, 70, 339)
CLUSTERS = {"icc_text": "0.05", "cluster_size_text": "21"}
"""A design effect of 2."""


def withheld(findings: OutcomeFindings) -> dict[str, str]:
    """The measures that are gaps, with the keys of the reasons."""
    return {key: figure.key for key, figure in findings.measures.items() if isinstance(figure, Gap)}


@pytest.mark.parametrize("family", ["score", "textbook"])
def test_clusters_widen_every_interval_and_leave_estimates(appraised, family):
    """A design effect of 2 leaves half the people: the intervals and p of half the table."""
    clustered = appraised(76, 748, 140, 678, family=family, **CLUSTERS)
    single = appraised(*TABLE, family=family)
    assert clustered.extras.clusters == Clusters(icc=0.05, mean_size=21, design_effect=2)
    assert clustered.test == single.test
    for key in MEASURES:
        assert clustered.measures[key] == single.measures[key]
    assert clustered.counts.total == 2 * single.counts.total


def test_clusters_have_no_exact_methods(appraised):
    """Halves of people cannot be counted; what is asymptotic in the exact family stands."""
    measures = appraised(*TABLE, family="exact", **CLUSTERS).measures
    assert Gap("cluster-no-exact") == measures["odds_ratio"].interval == measures["risk_index"].interval
    assert isinstance(measures["risk_difference"].interval, Interval)


@pytest.mark.parametrize(
    ("fields", "key", "mark"),
    [
        ({"cluster_size_text": "21"}, "cluster-without-icc", None),
        ({"icc_text": "0.05"}, "cluster-size-missing", None),
        ({"icc_text": "1.5", "cluster_size_text": "21"}, "cluster-without-icc", "icc-out-of-range"),
        ({"icc_text": "0.05", "cluster_size_text": "half"}, "cluster-size-missing", "not-an-amount"),
    ],
)
@pytest.mark.parametrize("family", FAMILIES)
def test_clusters_that_are_half_known_leave_no_interval_and_no_p(appraised, fields, key, mark, family):
    """The estimates stand, the number needed with them; the caution says what is missing."""
    findings = appraised(*TABLE, family=family, **fields)
    assert Gap(key) == findings.test.p == findings.extras.clusters
    for measure in set(MEASURES) - {"number_needed"}:
        assert Gap(key) == findings.measures[measure].interval
        assert isinstance(findings.measures[measure].estimate, float)
    assert [found.key for found in findings.marks] == ([mark] if mark else [])
    assert [caution.facts for caution in findings.cautions if caution.key == "cluster-without-icc"] == [{"reason": key}]


def test_clusters_of_one_correct_nothing(appraised):
    """A design effect of 1 is no correction, and exact methods stand."""
    findings = appraised(*TABLE, family="exact", icc_text="0", cluster_size_text="21")
    assert findings.measures == appraised(*TABLE, family="exact").measures
    assert "cluster-corrected" not in {caution.key for caution in findings.cautions}


def test_too_few_people_are_left_is_a_reason(appraised):
    """Whole villages that are all alike leave less than one person."""
    findings = appraised(3, 7, 5, 5, icc_text="1", cluster_size_text="1,000")
    assert Gap("too-few-left") == findings.measures["risk_difference"].interval


@pytest.mark.parametrize("baseline", ["", "12%"])
def test_varied_follow_up_gives_no_number_needed(appraised, baseline):
    """Neither in the study nor for the patient; a survey keeps its own reason."""
    findings = appraised(*TABLE, baseline=baseline, follow_up_varied=True)
    assert withheld(findings) == {"number_needed": "follow-up-varied"}
    assert Gap("follow-up-varied") == findings.patient.number_needed
    assert "follow-up-varied" in {caution.key for caution in findings.cautions}
    survey = appraised(*TABLE, design="survey", baseline=baseline, follow_up_varied=True)
    assert Gap("design-survey-nnt") == survey.patient.number_needed


def test_events_are_no_people(appraised):
    """A risk from counts of events is refused, with all that follows from it."""
    findings = appraised(*TABLE, counting="events", baseline="12%")
    assert withheld(findings) == dict.fromkeys(MEASURES, "events-not-people")
    assert Gap("events-not-people") == findings.test == findings.patient == findings.conversion
    assert findings.counts.total == 821


@pytest.mark.parametrize("design", ["matched", "paired", "before-after"])
def test_designs_of_pairs_refuse_unpaired_counts(appraised, design):
    """The unmatched odds ratio of a matched study among them."""
    findings = appraised(*TABLE, design=design, baseline="12%")
    assert withheld(findings) == dict.fromkeys(MEASURES, "design-needs-pairs")
    assert Gap("design-needs-pairs") == findings.test == findings.patient == findings.conversion
    assert findings.cautions == ()


def test_losses_as_each_scenario_has_them(appraised):
    """30 and 20 lost beside 412 and 409 (Akl 2012, BMJ 344:e2809, names the scenarios)."""
    findings = appraised(*TABLE, first_lost_text="30", second_lost_text="20", first_loss_ratio_text="2")
    losses = findings.extras.losses
    risks = {scenario.key: (scenario.risk_index, scenario.risk_reference) for scenario in losses.scenarios}
    assert risks == {
        "none": pytest.approx((38 / 442, 70 / 429)),
        "all": pytest.approx((68 / 442, 90 / 429)),
        "worst": pytest.approx((68 / 442, 70 / 429)),
        "best": pytest.approx((38 / 442, 90 / 429)),
        "ratio": pytest.approx(((38 + 30 * 2 * 38 / 412) / 442, 70 / 409)),
    }
    assert losses.overturned == ("worst",)
    (told,) = (caution.facts for caution in findings.cautions if caution.key == "losses-overturn")
    assert told == {"lost": 50, "index_lost": 30, "reference_lost": 20, "scenarios": "worst"}


def test_a_ratio_among_the_lost_is_asked_only_where_it_is_typed(appraised):
    """Without one there are four scenarios; they follow the index group and the counted outcome."""
    losses = appraised(*TABLE, first_lost_text="30", second_lost_text="20", index_group="second").extras.losses
    assert (losses.index_lost, losses.reference_lost) == (20, 30)
    assert [scenario.key for scenario in losses.scenarios] == ["none", "all", "worst", "best"]


@pytest.mark.parametrize(
    ("fields", "key"),
    [
        ({"first_lost_text": "30"}, "losses-of-one-group"),
        ({"first_lost_text": "0", "second_lost_text": "0"}, "no-losses"),
        ({"first_lost_text": "some", "second_lost_text": "2"}, "losses-unreadable"),
        ({"first_loss_ratio_text": "2"}, "losses-of-one-group"),
    ],
)
def test_losses_that_are_not_known_are_a_reason(appraised, fields, key):
    """And the table goes on."""
    findings = appraised(*TABLE, **fields)
    assert Gap(key) == findings.extras.losses
    assert withheld(findings) == {}


def test_those_randomised_and_not_in_the_table_are_lost(appraised):
    """Where nobody says how many were lost; what then does not add up is cautioned by group."""
    losses = appraised(*TABLE, first_randomised_text="442", second_randomised_text="429").extras.losses
    assert (losses.index_lost, losses.reference_lost) == (30, 20)
    told = appraised(
        *TABLE,
        first_randomised_text="450",
        second_randomised_text="400",
        first_lost_text="30",
        first_label_text=" night  lights ",
    )
    assert [caution.facts for caution in told.cautions if caution.key == "randomised-differs"] == [
        {"group": "index", "label": "night lights", "randomised": 450, "analysed": 412, "lost": 30},
        {"group": "reference", "label": "", "randomised": 400, "analysed": 409, "lost": 0},
    ]


@pytest.mark.parametrize("design", ["survey", "case-control"])
def test_only_those_who_are_followed_can_be_lost(appraised, design):
    """A survey and a case-control study have no losses."""
    assert appraised(*TABLE, design=design, first_lost_text="3", second_lost_text="2").extras.losses is None


def test_a_trial_has_its_fragility_beside_the_number_lost(appraised):
    """1/100 against 9/100 (invented) has a fragility of 1 (Walsh 2014, J Clin Epidemiol 67:622, for the definition)."""
    fragility = appraised(1, 99, 9, 91, first_lost_text="3", second_lost_text="4").extras.fragility
    assert isinstance(fragility, Fragility)
    assert (fragility.changes, fragility.group, fragility.lost) == (1, "index", 7)
    assert fragility.p_before < 0.05 <= fragility.p_after
    assert appraised(5, 95, 9, 91).extras.fragility.key == "fragility-not-below"
    assert appraised(1, 99, 9, 91, design="cohort").extras.fragility is None
    assert Gap("clusters-not-here") == appraised(1, 99, 9, 91, **CLUSTERS).extras.fragility


def test_fragility_follows_where_a_keystroke_would_wait(study, monkeypatch):
    """Until the libraries are loaded, and at hundreds of millions a cell."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    findings = appraise(study(1, 99, 9, 92), Choices(), deferring=True)
    assert Gap("follows") == findings.extras.fragility
    assert waits(findings)
    monkeypatch.setattr(module, "numbers_loaded", lambda: True)
    assert isinstance(appraise(study(1, 99, 9, 92), Choices(), deferring=True).extras.fragility, Fragility)
    huge = study(4 * 10**8, 6 * 10**8, 3 * 10**8, 7 * 10**8)
    assert Gap("follows") == appraise(huge, Choices(), deferring=True).extras.fragility


def test_a_cohort_has_attributable_fractions(appraised):
    """30% against 10%: two thirds of the exposed people's events, half of all of them (by algebra)."""
    extras = appraised(30, 70, 10, 90, design="cohort").extras
    assert extras.attributable_exposed.estimate == pytest.approx(2 / 3)
    assert extras.attributable_exposed.method == "miettinen-nurminen"
    assert extras.attributable_population.estimate == pytest.approx(0.5)
    assert extras.attributable_population.method == "attributable-population"
    assert extras.attributable_exposed.interval.low < 2 / 3 < extras.attributable_exposed.interval.high
    assert extras.prevented_exposed is None
    assert appraised(30, 70, 10, 90).extras.attributable_exposed is None


def test_a_cohort_whose_exposed_fare_better_has_a_prevented_fraction(appraised):
    """10% against 30%: two thirds of the events expected of the exposed are prevented (by algebra); in trials none."""
    extras = appraised(10, 90, 30, 70, design="cohort").extras
    assert extras.attributable_exposed.key == extras.attributable_population.key == "ratio-below-one"
    assert extras.prevented_exposed.estimate == pytest.approx(2 / 3)
    mirrored = appraised(10, 90, 30, 70).measures["risk_ratio"].interval
    limits = extras.prevented_exposed.interval
    assert (limits.low, limits.high) == (1 - mirrored.high, 1 - mirrored.low)
    assert appraised(10, 90, 30, 70).extras.prevented_exposed is None
    assert appraised(20, 80, 20, 80, design="cohort").extras.prevented_exposed is None


@pytest.mark.parametrize("outcome", [person_time(), at_time(design="cohort"), strata()])
def test_every_cohort_has_the_fraction_of_its_own_ratio(outcome):
    """Of the rate ratio, of the printed risks' ratio, of the pooled ratio: all below 1 here."""
    findings = appraise(outcome, Choices())
    pooled = findings.strata.pooled["pooled_risk_ratio"] if findings.form == "strata" else None
    ratio = pooled or findings.measures["rate_ratio" if findings.form == "person-time" else "risk_ratio"]
    assert findings.extras.prevented_exposed.estimate == pytest.approx(1 - ratio.estimate)
    assert findings.extras.prevented_exposed.method == ratio.method


@pytest.mark.parametrize(
    "outcome", [of_total(design="cohort"), person_time(), at_time(design="cohort"), strata(), paired("matched")]
)
def test_an_adjusted_ratio_beside_any_table_has_the_e_value(outcome):
    """It has dealt with some confounding already (VanderWeele and Ding 2017): R + sqrt(R (R - 1)) of 1/0.5 is 3.41."""
    printed = structs.replace(outcome, adjusted_measure="risk_ratio", adjusted_text="0.50 (0.40 to 0.62)")
    found = appraise(printed, Choices()).extras.e_value
    assert found.adjusted
    assert found.estimate == pytest.approx(2 + 2**0.5)


@pytest.mark.parametrize(
    ("design", "measure"), [("cohort", "risk_ratio"), ("survey", "risk_ratio"), ("case-control", "odds_ratio")]
)
def test_observational_ratios_have_an_e_value(appraised, design, measure):
    """Of the ratio that the design gives; a trial has none."""
    values = appraised(30, 70, 10, 90, design=design).extras.e_value
    assert (values.measure, values.adjusted, values.converted) == (measure, False, "")
    assert 1 < values.limit < values.estimate
    assert appraised(30, 70, 10, 90).extras.e_value is None


def test_the_e_value_is_of_the_adjusted_ratio_where_one_is_printed(appraised):
    """An odds ratio of an outcome of over 15% is converted first, a rare one's is not."""
    printed = {"design": "cohort", "adjusted_text": "OR 4 (2.25 to 9)"}
    common, rare = appraised(30, 70, 10, 90, **printed).extras, appraised(3, 97, 1, 99, **printed).extras
    assert (common.e_value.converted, common.e_value.adjusted) == ("odds_ratio", True)
    assert common.e_value.estimate == pytest.approx(2 + 2**0.5)
    assert (rare.e_value.converted, rare.e_value.estimate) == ("", pytest.approx(4 + 12**0.5))
    assert common.adjusted.measure == "odds_ratio"
    hazard = appraised(30, 70, 10, 90, design="cohort", adjusted_text="HR 1 (0.5 to 2)").extras.e_value
    assert (hazard.converted, hazard.estimate, hazard.limit) == ("hazard_ratio", 1, 1)


def test_an_adjusted_effect_is_kept_beside_crude_counts(appraised):
    """Outside trials it is said that the figures are crude; what cannot be read is marked."""
    findings = appraised(*TABLE, design="cohort", adjusted_text="0.5 (0.3 to 0.8)", adjusted_for_text="age")
    told = {caution.key: caution.facts for caution in findings.cautions}
    assert told["crude-beside-adjusted"] == {"measure": "odds_ratio", "value": "0.5", "adjusted_for": "age"}
    assert "crude-beside-adjusted" not in {caution.key for caution in appraised(*TABLE, adjusted_text="0.5").cautions}
    unread = appraised(*TABLE, adjusted_text="strong")
    assert [(mark.field, mark.key) for mark in unread.marks] == [("adjusted_text", "paper-unreadable")]
    assert unread.extras.adjusted is None
    assert isinstance(unread.measures["number_needed"], NumberNeeded)


def test_numbers_of_the_abstract_are_cautioned(appraised):
    """Where in the paper they stand is the reader's to say."""
    assert "abstract-only" in {caution.key for caution in appraised(*TABLE, where="abstract").cautions}
    assert "abstract-only" not in {caution.key for caution in appraised(*TABLE, where="table").cautions}


def test_everything_unsaid_changes_nothing(appraised):
    """A trial without any of these has no more than its fragility under the fold."""
    extras = appraised(*TABLE).extras
    assert isinstance(extras.fragility, Fragility)
    assert (extras.losses, extras.clusters, extras.e_value, extras.adjusted, extras.recovered) == (None,) * 5
    assert isinstance(appraised(*TABLE).measures["risk_ratio"], Figure)
