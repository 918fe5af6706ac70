"""Tests of each caution: where it holds, and just beside it where it does not."""

from __future__ import annotations

import math

import pytest

from fourcount.appraisal.cautions import CAUTIONS

TABLE = (38, 374, 70, 339)


def test_the_keys_in_order():
    """What changes the reader's conclusion comes first."""
    assert list(dict.fromkeys(rule.key for rule in CAUTIONS)) == [
        "read-as", "percent-disagrees", "percent-several", "percent-none", "index-looks-like-control", "no-control",
        "abstract-only", "cannot-be-checked", "interval-rebuilt", "printed-level", "concordant-unknown",
        "hazard-ratio", "events-counted", "follow-up-varied", "randomised-differs", "losses-overturn",
        "cluster-without-icc", "cluster-corrected", "cluster-uncorrected", "strata-part", "strata-odds-ratio-parts",
        "strata-unlike", "strata-small", "no-meta-analysis", "odds-ratio-differs", "effect-kept-constant",
        "effect-kept-elsewhere", "difference-kept-constant", "baseline-far", "constant-rates", "other-span",
        "solved-from-overall", "from-a-rate", "baseline-uncertain", "rests-on-baseline",
        "controls-over-time", "totals-are-sampled", "observational", "adjusted-effect", "crude-beside-adjusted",
        "within-pairs", "adjusted-opposite", "adjusted-turned", "carried-level",
        "adjusted-converted", "zero-cells", "half-added", "through-no-effect", "family-parts", "rare-harm", "leans",
    ]  # fmt: skip


def test_every_rule_names_its_source():
    """No caution stands on nothing."""
    assert all(rule.source for rule in CAUTIONS)


def test_a_plain_trial_has_no_caution(facts):
    """A trial without zeros, with an interval on one side and the two ratios close together, needs none."""
    assert facts(*TABLE) == {}


def test_nothing_is_cautioned_without_counts(appraised):
    """An empty table has no cautions."""
    assert appraised("", "", "", "", design="cohort", baseline="12%").cautions == ()


# The quotient of the two ratios is the reference group's risk of not having the event over the index group's.
@pytest.mark.parametrize(
    ("cells", "holds"),
    [
        ((50, 50, 40, 60), False),  # exactly 1.2
        ((50, 50, 39, 61), True),
        ((40, 60, 50, 50), False),  # the same, groups swapped
        ((39, 61, 50, 50), True),
        ((50, 50, 50, 50), False),
    ],
)
def test_odds_ratio_differs_over_20_percent(facts, cells, holds):
    """The odds ratio is over 20% from the risk ratio, in either direction."""
    assert holds == ("odds-ratio-differs" in facts(*cells))


def test_odds_ratio_differs_tells_both(facts):
    """The facts are the two ratios."""
    assert facts(80, 20, 50, 50)["odds-ratio-differs"] == [{"odds_ratio": 4.0, "risk_ratio": 1.6}]


def test_odds_ratio_differs_where_it_is_endless(facts):
    """Everybody in the index group: the odds ratio is infinite and the risk ratio 2."""
    assert [{"odds_ratio": math.inf, "risk_ratio": 2.0}] == facts(20, 0, 10, 10)["odds-ratio-differs"]


@pytest.mark.parametrize("cells", [(0, 20, 10, 10), (10, 10, 0, 20), (0, 20, 0, 20), (20, 0, 20, 0)])
def test_odds_ratio_differs_not_where_both_are_alike_or_missing(facts, cells):
    """Both 0, both infinite, or one without a value: nothing to tell apart."""
    assert "odds-ratio-differs" not in facts(*cells)


def test_odds_ratio_differs_not_in_a_case_control_study(facts):
    """A case-control study has no risk ratio to differ from."""
    assert "odds-ratio-differs" not in facts(80, 20, 50, 50, design="case-control")


@pytest.mark.parametrize("design", ["cohort", "survey", "case-control"])
def test_observational_designs(facts, design):
    """Without randomisation the crude effect may be confounded."""
    assert [{"design": design}] == facts(*TABLE, design=design)["observational"]


@pytest.mark.parametrize(
    ("cells", "count"), [((0, 20, 3, 17), 1), ((0, 20, 0, 20), 2), ((0, 20, 20, 0), 2), ((0, 0, 3, 7), 2)]
)
def test_zero_cells_are_counted(facts, cells, count):
    """The number of counts that are 0."""
    assert [{"count": count}] == facts(*cells)["zero-cells"]


def test_half_added_names_each_measure(facts):
    """The textbook family adds 1/2 for the risk ratio and for the odds ratio where there are no events."""
    found = facts(0, 20, 3, 17, family="textbook")["half-added"]
    assert found == [{"measure": "risk_ratio"}, {"measure": "odds_ratio"}]


def test_half_added_for_the_odds_ratio_alone(facts):
    """With a zero among the non-events the risk ratio's formula needs no correction."""
    assert facts(20, 0, 15, 5, family="textbook")["half-added"] == [{"measure": "odds_ratio"}]


def test_half_added_to_a_case_control_studys_odds_ratio_alone(facts):
    """A withheld measure has no correction to tell."""
    found = facts(0, 20, 3, 17, family="textbook", design="case-control")["half-added"]
    assert found == [{"measure": "odds_ratio"}]


@pytest.mark.parametrize(("cells", "family"), [((0, 20, 3, 17), "score"), (TABLE, "textbook")])
def test_half_added_not_where_nothing_was_added(facts, cells, family):
    """The score family adds nothing, and the textbook family nothing where no count is 0."""
    assert "half-added" not in facts(*cells, family=family)


@pytest.mark.parametrize(("cells", "through"), [((10, 90, 12, 88), True), (TABLE, False), ((0, 20, 0, 20), True)])
@pytest.mark.parametrize("design", ["trial", "case-control"])
def test_through_no_effect(facts, cells, through, design):
    """An interval that holds both fewer and more, by the odds ratio where there is no difference."""
    assert through == ("through-no-effect" in facts(*cells, design=design))


def test_through_no_effect_not_by_the_odds_ratio_where_the_difference_has_no_interval(facts):
    """The textbook difference of 0/20 v 0/20 has no interval, the headline says so, and Gart's cannot deny it."""
    assert "through-no-effect" not in facts(0, 20, 0, 20, family="textbook")
    assert "through-no-effect" not in facts(50, 0, 50, 0, family="textbook")


def test_through_no_effect_not_where_nothing_has_an_interval(facts):
    """Nobody in a group: no interval, so none that goes through no effect."""
    assert "through-no-effect" not in facts(0, 0, 3, 17)


def test_family_parts_where_p_and_interval_differ(facts):
    """7/34 v 1/34: Fisher's p is over 0.05 while the exact family's asymptotic difference is above 0."""
    assert facts(7, 27, 1, 33, family="exact")["family-parts"] == [{}]
    assert "family-parts" not in facts(7, 27, 1, 33)


def test_family_parts_follows_the_level(facts):
    """At 80% p and intervals agree that there is an effect."""
    assert "family-parts" not in facts(7, 27, 1, 33, family="exact", level=0.8)


def test_family_parts_not_while_the_test_has_no_value(facts):
    """Nobody in a group: neither a p nor an interval that could part."""
    assert "family-parts" not in facts(0, 0, 3, 17)


@pytest.mark.parametrize(
    ("cells", "rest", "holds"),
    [
        ((9, 991, 1, 999), {}, True),
        ((10, 990, 1, 999), {}, False),  # exactly 1%
        ((9, 991, 9, 991), {}, False),  # no more frequent
        ((1, 999, 9, 991), {}, False),
        ((9, 991, 1, 999), {"left_welcome": True}, False),
        ((9, 991, 1, 999), {"design": "cohort"}, False),
        ((9, 991, 1, 999), {"design": "case-control"}, False),
        ((18, 1982, 10, 1990), {}, True),  # ten harmed or more, and the interval includes 0
        ((9000, 991_000, 1000, 999_000), {}, False),  # a trial of two million people shows it
    ],
)
def test_rare_harm(facts, cells, rest, holds):
    """In a trial too small for it, an unwelcome event under 1% that is more frequent in the index group."""
    assert ([{"risk": 0.009}] if holds else None) == facts(*cells, **rest).get("rare-harm")


def test_leans_to_more(facts):
    """A risk ratio is symmetric on its logarithm, so a difference through 0 reaches further towards more."""
    assert facts(10, 90, 12, 88, baseline="12%")["leans"] == [{"side": "more"}]


def test_leans_not_towards_the_estimates_own_side(facts):
    """An estimate on the side of more that reaches further towards more misleads nobody."""
    assert "leans" not in facts(12, 88, 10, 90, baseline="12%")


@pytest.mark.parametrize("rest", [{}, {"baseline": "x"}])
def test_leans_not_without_a_typed_risk(facts, rest):
    """The table's direct interval of the difference is not derived from a ratio."""
    assert "leans" not in facts(10, 90, 12, 88, **rest)


def test_leans_not_where_no_effect_is_outside(facts):
    """A difference whose interval lies on one side leans nowhere."""
    assert "leans" not in facts(*TABLE, baseline="12%")


def test_leans_where_the_upper_limit_is_withheld(facts):
    """A limit that passes 100% reaches further than any other."""
    assert facts(10, 90, 12, 88, baseline="70%")["leans"] == [{"side": "more"}]


def test_leans_to_fewer_by_odds_at_a_high_risk(facts):
    """Near 100% an odds ratio reaches further down than up."""
    assert facts(21, 79, 20, 80, baseline="95%", effect="odds_ratio")["leans"] == [{"side": "fewer"}]


def test_leans_not_where_the_estimate_is_no_effect(facts):
    """An estimate of no difference has no side."""
    assert "leans" not in facts(10, 90, 10, 90, baseline="12%")


def test_a_mark_that_is_used_is_a_caution(facts):
    """A count that disagrees with its percentage, and one that a space parts, are told wherever cautions are."""
    found = facts("38 (9.9%)", 374, "70 (20%)", "1 339")
    assert [(f["text"], f["events"]) for f in found["percent-disagrees"]] == [("38 (9.9%)", 38), ("70 (20%)", 70)]
    assert found["read-as"] == [{"text": "1 339", "value": 1339}]


def test_a_cell_that_adds_up_is_no_caution(facts):
    """A percentage that the count gives says nothing."""
    assert facts("38 (9.2%)", 374, 70, 339) == {}


@pytest.mark.parametrize(
    ("index", "reference", "holds"),
    [
        ("Placebo", "Aspirin", True),
        ("the CONTROL group", "", True),
        ("usual  care", "night lights", True),
        ("Sham surgery", "Surgery", True),
        ("no treatment", "physiotherapy", True),
        ("Aspirin", "Placebo", False),
        ("Placebo", "no treatment", False),
        ("Controlled release", "Aspirin", False),
        ("", "", False),
    ],
)
def test_index_looks_like_control(facts, index, reference, holds):
    """A whole word that names a comparison, on the index side alone."""
    found = facts(*TABLE, first_label_text=index, second_label_text=reference).get("index-looks-like-control")
    assert found == ([{"label": " ".join(index.split())}] if holds else None)


def test_index_looks_like_control_until_the_groups_are_swapped(facts):
    """Swapping the groups puts the comparison where it belongs."""
    rest = {"first_label_text": "placebo", "second_label_text": "aspirin"}
    assert "index-looks-like-control" in facts(*TABLE, **rest)
    assert "index-looks-like-control" not in facts(*TABLE, index_group="second", **rest)


def test_a_survey_is_named_where_its_ratio_has_another_name(facts):
    """The facts of the cautions that speak of a risk ratio say that it is one of prevalences."""
    found = facts(0, 20, 12, 8, design="survey", baseline="30%", family="textbook")
    for key in ("effect-kept-constant", "half-added"):
        assert all(each["design"] == "survey" for each in found[key])
    assert "design" not in facts(*TABLE, baseline="12%")["effect-kept-constant"][0]
    assert facts(80, 20, 50, 50, design="survey")["odds-ratio-differs"][0]["design"] == "survey"
