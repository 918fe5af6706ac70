"""Counts of pairs: what each design gives, and which side is which. All tables are invented."""

from __future__ import annotations

import pytest

from fourcount.appraisal import appraise as module
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import PAIR_MEASURES, Figure, Gap, Interval, NumberNeeded, PairCounts, Totals
from fourcount.appraisal.waiting import waits
from fourcount.record import editing
from fourcount.record.outcome import CELLS, Outcome, Pairs
from fourcount.record.paper import FAMILIES, Choices


def pairs(both="12", first="30", second="9", neither="49", **rest):
    """An outcome of pair counts, of one person twice unless another design is named."""
    table = Pairs(**dict(zip(CELLS, (both, first, second, neither), strict=True)))
    return Outcome(table=table, **{"design": "paired", **rest})


def found(*counts, **rest):
    """The findings under the default choices."""
    return appraise(pairs(*counts, **rest), Choices())


def withheld(findings):
    """The measures that are gaps, with the keys of the reasons."""
    return {key: figure.key for key, figure in findings.measures.items() if isinstance(figure, Gap)}


def test_pairs_give_difference_ratio_and_odds_ratio():
    """42 of 100 against 21 of 100, and 30 against 9 discordant pairs."""
    findings = found()
    assert findings.given == PairCounts(both=12, index_only=30, reference_only=9, neither=49)
    assert Gap("not-counts") == findings.counts
    estimates = {key: figure.estimate for key, figure in findings.measures.items()}
    assert estimates == pytest.approx(
        {
            "pair_risk_index": 0.42,
            "pair_risk_reference": 0.21,
            "pair_difference": 0.21,
            "number_needed": 1 / 0.21,
            "pair_ratio": 2,
            "pair_odds_ratio": 30 / 9,
        }
    )
    assert isinstance(findings.measures["number_needed"], NumberNeeded)
    assert findings.test.method == "mcnemar-mid-p"


def test_the_margins_are_those_of_one_side_by_the_other():
    """The four cells are the table of the first side (down) by the second (across)."""
    assert found().totals == Totals(
        first_left=12, first_right=30, second_left=9, second_right=49, first=42, second=58, left=21, right=79,
        everyone=100,
    )  # fmt: skip


@pytest.mark.parametrize("family", FAMILIES)
def test_swapping_the_sides_turns_every_comparison(family):
    """The difference changes its sign, ratios are turned over, p stays."""
    one, other = (appraise(pairs(index_group=group), Choices(family=family)).measures for group in ("first", "second"))
    assert one["pair_difference"].estimate == -other["pair_difference"].estimate
    assert one["pair_difference"].interval.low == pytest.approx(-other["pair_difference"].interval.high)
    for key in ("pair_ratio", "pair_odds_ratio"):
        assert one[key].estimate == pytest.approx(1 / other[key].estimate)
        assert one[key].interval.low == pytest.approx(1 / other[key].interval.high)
    assert one["pair_risk_index"] == other["pair_risk_reference"]


def test_counting_the_other_outcome_turns_both_into_neither():
    """The pairs with the event on the index side only are those without it on the reference side only."""
    outcome = pairs()
    findings = appraise(editing.count_other_outcome(outcome), Choices())
    assert findings.given == PairCounts(both=49, index_only=9, reference_only=30, neither=12)
    again = found().measures
    assert findings.measures["pair_difference"].estimate == -again["pair_difference"].estimate
    assert findings.measures["pair_odds_ratio"].estimate == pytest.approx(1 / again["pair_odds_ratio"].estimate)
    assert findings.test.p == pytest.approx(found().test.p)


def test_a_matched_case_control_study_gives_its_odds_ratio_only():
    """Everything else is withheld; McNemar's test is the odds ratio's."""
    findings = found(design="matched")
    reasons = dict.fromkeys((key for key in PAIR_MEASURES if key != "pair_odds_ratio"), "design-matched")
    assert withheld(findings) == reasons
    assert isinstance(findings.test.p, float)
    assert findings.extras.e_value.measure == "odds_ratio"


def test_before_and_after_has_no_number_needed_and_says_what_is_missing():
    """Nobody shows what would have happened without."""
    findings = found(design="before-after")
    assert withheld(findings) == {"number_needed": "design-before-after"}
    assert "no-control" in {caution.key for caution in findings.cautions}


@pytest.mark.parametrize("design", ["trial", "cohort", "survey", "case-control"])
def test_pairs_need_a_design_of_pairs(design):
    """In any other design the table says nothing."""
    findings = found(design=design)
    assert withheld(findings) == dict.fromkeys(PAIR_MEASURES, "pairs-need-design")
    assert Gap("pairs-need-design") == findings.test == findings.patient


def test_discordant_pairs_alone_give_the_odds_ratio():
    """What needs the concordant ones is withheld; with both known the ratio stands too, whose pairs those are."""
    findings = found("", "30", "9", "")
    needs = ("pair_risk_index", "pair_risk_reference", "pair_difference", "number_needed")
    assert withheld(findings) == dict.fromkeys((*needs, "pair_ratio"), "concordant-pairs-unknown")
    assert findings.measures["pair_odds_ratio"] == found().measures["pair_odds_ratio"]
    assert Gap("concordant-pairs-unknown") == findings.given
    assert "concordant-unknown" in {caution.key for caution in findings.cautions}
    assert withheld(found("12", "30", "9", "")) == dict.fromkeys(needs, "concordant-pairs-unknown")
    assert found("12", "30", "9", "").measures["pair_ratio"] == found().measures["pair_ratio"]


def test_pairs_that_are_not_whole_say_nothing():
    """A blank discordant cell is waited for; one that cannot be read is marked."""
    assert Gap("pairs-not-typed") == found("12", "30", "", "49").given
    findings = found("12", "thirty", "9", "49")
    assert Gap("unreadable") == findings.given
    assert [(mark.field, mark.key) for mark in findings.marks] == [("first_right_text", "not-a-count")]


@pytest.mark.parametrize("family", FAMILIES)
def test_no_discordance_is_said(family):
    """The odds ratio is 0/0; risks and the difference of 0 stand."""
    findings = appraise(pairs("12", "0", "0", "49"), Choices(family=family))
    assert withheld(findings)["pair_odds_ratio"] == "no-discordant-pairs"
    assert findings.measures["pair_difference"].estimate == 0


def test_events_are_no_share_of_pairs_and_varied_follow_up_gives_no_number_needed():
    """Several events may be one person's."""
    assert set(withheld(found(counting="events")).values()) == {"events-not-people"}
    assert withheld(found(follow_up_varied=True)) == {"number_needed": "follow-up-varied"}


def test_clusters_of_pairs_have_no_intervals():
    """The estimates stand; limits without a correction would be too narrow."""
    findings = found(icc_text="0.05", cluster_size_text="20")
    assert Gap("clusters-not-here") == findings.measures["pair_difference"].interval == findings.test.p
    assert findings.measures["pair_difference"].estimate == pytest.approx(0.21)


def test_mid_p_follows_until_the_libraries_are_loaded(monkeypatch):
    """The default family of pairs has two figures that need them; closed forms stand at once."""
    monkeypatch.setattr(module, "numbers_loaded", lambda: False)
    findings = appraise(pairs("1", "2", "3", "4"), Choices(), deferring=True)
    assert Gap("follows") == findings.measures["pair_odds_ratio"].interval == findings.test.p
    assert isinstance(findings.measures["pair_difference"].interval, Interval)
    assert waits(findings)
    textbook = appraise(pairs("1", "2", "3", "4"), Choices(family="textbook"), deferring=True)
    assert not waits(textbook)
    assert isinstance(textbook.measures["pair_odds_ratio"], Figure)
