"""Tests of the cautions about a typed starting risk and about the studies that need one."""

from __future__ import annotations

import math

import pytest

TABLE = (38, 374, 70, 339)


@pytest.mark.parametrize("design", ["trial", "cohort", "survey"])
def test_effect_kept_constant(facts, design):
    """A typed starting risk takes the relative effect elsewhere; the facts tell which and from where."""
    (found,) = facts(*TABLE, design=design, baseline="12%")["effect-kept-constant"]
    assert (found["effect"], found["baseline"]) == ("risk_ratio", 0.12)
    assert math.isclose((38 / 412) / (70 / 409), found["value"])
    assert math.isclose(70 / 409, found["study"])


@pytest.mark.parametrize("rest", [{}, {"design": "case-control", "baseline": "12%"}, {"baseline": "x"}])
def test_effect_kept_constant_not_without_another_risk(facts, rest):
    """The table's own risk, a study without risks, and an unreadable risk carry nothing elsewhere."""
    assert "effect-kept-constant" not in facts(*TABLE, **rest)


@pytest.mark.parametrize(
    ("reference", "baseline", "told"),
    [
        ((60, 1149), "5%", False),  # 60/1209 is 4.96%
        ((60, 1149), "5.02%", True),
        ((9, 11991), "0.075%", False),
        ((9, 11991), "0.08%", True),
        ((0, 100), "0%", False),
    ],
)
def test_effect_kept_constant_not_at_what_is_printed_as_the_same_risk(facts, reference, baseline, told):
    """ "The same at 5% as at the study's own 5.0%" tells nobody anything."""
    assert told == ("effect-kept-constant" in facts(40, 960, *reference, baseline=baseline, effect="odds_ratio"))


@pytest.mark.parametrize("effect", ["risk_ratio", "odds_ratio"])
@pytest.mark.parametrize(("baseline", "kept"), [("0%", False), ("100%", False), ("1%", True)])
def test_effect_kept_constant_not_where_no_ratio_moves_anybody(facts, effect, baseline, kept):
    """Nobody stays nobody, and everybody stays so or would pass 100%."""
    table = (70, 339, 38, 374)
    assert kept == ("effect-kept-constant" in facts(*table, baseline=baseline, effect=effect))
    assert "effect-kept-constant" not in facts(*table, baseline="60%")


@pytest.mark.parametrize(
    ("cells", "baseline", "other"),
    [
        # 1 - 0.88 (374/412)/(339/409) = 3.6%, and 0.12 (38/412)/(70/409) = 6.5%
        (TABLE, "12%", pytest.approx(1 - 0.88 * (374 / 412) / (339 / 409))),
        (TABLE, "2%", "less than 0%"),
        ((38, 374, 20, 389), "5%", None),
    ],
)
def test_the_other_risk_ratio_is_told_where_people_would_see_it(facts, cells, baseline, other):
    """Keeping the risk ratio of not having the event gives another risk; of 5% both make 9 in 100."""
    (found,) = facts(*cells, baseline=baseline)["effect-kept-constant"]
    assert found.get("other") == other
    assert "other" not in facts(*cells, baseline=baseline, effect="odds_ratio")["effect-kept-constant"][0]


@pytest.mark.parametrize(
    ("baseline", "far"), [("5%", False), ("4.9%", True), ("20%", False), ("20.1%", True), ("10%", False)]
)
def test_baseline_far_beyond_half_or_twice(facts, baseline, far):
    """Half and twice the study's 10% are still near."""
    assert far == ("baseline-far" in facts(8, 92, 10, 90, baseline=baseline))


def test_baseline_far_tells_both_risks(facts):
    """The facts are the typed risk and the study's."""
    assert facts(8, 92, 10, 90, baseline="50%")["baseline-far"] == [{"baseline": 0.5, "study": 0.1}]


def test_baseline_far_not_in_a_case_control_study(facts):
    """A case-control study has no risk to be far from."""
    assert "baseline-far" not in facts(8, 92, 10, 90, baseline="90%", design="case-control")


@pytest.mark.parametrize("design", ["trial", "case-control"])
def test_baseline_uncertain_with_a_bare_risk(facts, design):
    """A bare value brings no uncertainty of its own, in any design."""
    assert facts(*TABLE, baseline="12%", design=design)["baseline-uncertain"] == [{"baseline": 0.12}]


def test_baseline_uncertain_not_for_the_tables_own_risk(facts):
    """The table's direct intervals leave nothing out."""
    assert "baseline-uncertain" not in facts(*TABLE)


def test_baseline_uncertain_not_without_a_range(facts):
    """Where no range is given nothing is said of it."""
    assert "baseline-uncertain" not in facts(5, 0, 8, 0, baseline="12%", family="textbook")
    assert "baseline-uncertain" not in facts(80, 20, 20, 80, baseline="50%")  # four times 50% is no risk
    assert "baseline-uncertain" not in facts(*TABLE, baseline="0%")  # nobody stays nobody


@pytest.mark.parametrize("design", ["trial", "cohort", "survey", "case-control"])
@pytest.mark.parametrize("baseline", ["", "12%"])
def test_totals_are_sampled_in_a_case_control_study_only(facts, design, baseline):
    """There the totals are those of cases and controls; with a starting risk, what all rests on says so."""
    found = facts(*TABLE, design=design, baseline=baseline)
    told = "totals-are-sampled" in found, any("totals" in one for one in found.get("rests-on-baseline", ()))
    assert told == (design == "case-control" and not baseline, design == "case-control" and bool(baseline))


def test_a_case_control_study_with_a_starting_risk_rests_on_it(facts):
    """Every absolute figure rests on the typed risk, and the controls' sampling decides what the ratio is."""
    found = facts(*TABLE, design="case-control", baseline="12%")
    assert found["rests-on-baseline"] == [{"baseline": 0.12, "effect": "odds_ratio", "totals": "sampled"}]
    assert found["controls-over-time"] == [{"design": "case-control"}]


@pytest.mark.parametrize("rest", [{"design": "case-control"}, {"design": "cohort", "baseline": "12%"}])
def test_rests_on_baseline_not_otherwise(facts, rest):
    """Without a typed risk nothing is carried; a cohort has risks of its own."""
    found = facts(*TABLE, **rest)
    assert "rests-on-baseline" not in found
    assert "controls-over-time" not in found
