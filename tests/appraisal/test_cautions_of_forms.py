"""Cautions of single forms of print and of what stands beside a table: where they hold, and just beside it."""

from __future__ import annotations

import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.cautions import CAUTIONS
from fourcount.record.outcome import CELLS, FORMS, EffectOnly, Outcome, Pairs, PercentOfTotal, PersonTime
from fourcount.record.paper import Choices

TABLE = (38, 374, 70, 339)
CLUSTERS = {"icc_text": "0.05", "cluster_size_text": "21"}


def cells(*texts):
    """Four texts by the names of their cells."""
    return dict(zip(CELLS, texts, strict=True))


def told(outcome):
    """The facts of the cautions of an outcome by key."""
    return {caution.key: caution.facts for caution in appraise(outcome, Choices()).cautions}


def test_every_rule_is_asked_of_forms_that_there_are():
    """Of one form at least, and of no unknown one."""
    assert all(rule.forms and set(rule.forms) <= set(FORMS) for rule in CAUTIONS)


def test_percentages_that_leave_a_choice_are_cautioned_in_every_copy():
    """Several counts that fit, or none; one that fits alone needs no word."""
    facts = told(Outcome(table=PercentOfTotal(**cells("9%", "412", "9.3%", "50"))))
    assert facts["percent-several"] == {"text": "9%", "total": 412, "value": 37, "counts": "36, 37, 38, 39"}
    assert facts["percent-none"] == {"text": "9.3%", "total": 50, "value": 5}
    plain = told(Outcome(table=PercentOfTotal(**cells("9.2%", "412", "17.1%", "409"))))
    assert {"percent-several", "percent-none"}.isdisjoint(plain)


def test_a_refused_table_still_says_how_its_cells_were_read():
    """And nothing else, since there is no figure to be careful with."""
    outcome = Outcome(
        table=PercentOfTotal(**cells("9%", "412", "0%", "409")), design="matched", where="abstract", **CLUSTERS
    )
    assert set(told(outcome)) == {"percent-several"}


def test_a_correction_for_clusters_is_said(facts):
    """With the design effect and what it is from; one of 1 is none."""
    (corrected,) = facts(*TABLE, **CLUSTERS)["cluster-corrected"]
    assert corrected == {"design_effect": 2.0, "icc": 0.05, "mean_size": 21.0}
    assert "cluster-corrected" not in facts(*TABLE, icc_text="0.05", cluster_size_text="1")
    assert "cluster-corrected" not in facts(*TABLE)


@pytest.mark.parametrize(
    "outcome",
    [
        Outcome(table=Pairs(**cells("12", "30", "9", "49")), design="paired", **CLUSTERS),
        Outcome(table=PersonTime(**cells("38", "4,120", "70", "4,090")), **CLUSTERS),
    ],
)
def test_forms_without_a_correction_for_clusters_say_so(outcome):
    """Once, instead of intervals that would be too narrow."""
    facts = told(outcome)
    assert facts["cluster-uncorrected"] == {}
    assert {"cluster-corrected", "cluster-without-icc"}.isdisjoint(facts)


def test_a_printed_adjusted_hazard_ratio_is_cautioned_beside_counts(facts):
    """As one that stands alone is."""
    assert facts(*TABLE, adjusted_text="HR 0.72 (0.55 to 0.92)")["hazard-ratio"] == [{"value": 0.72}]
    assert "hazard-ratio" not in facts(*TABLE, adjusted_text="OR 0.72 (0.55 to 0.92)")


def test_limits_that_are_printed_are_not_called_rebuilt():
    """Even where a p stands beside them."""
    outcome = Outcome(table=EffectOnly(), paper_text="RR 0.54 (0.37 to 0.78), P = 0.001")
    assert "interval-rebuilt" not in told(outcome)
    assert "interval-rebuilt" in told(Outcome(table=EffectOnly(), paper_text="RR 0.54, P = 0.001"))


def test_varied_follow_up_is_said_of_counts_and_not_of_person_time():
    """Person-time is one of its remedies."""
    pairs = Pairs(**cells("12", "30", "9", "49"))
    assert "follow-up-varied" in told(Outcome(table=pairs, design="paired", follow_up_varied=True))
    timed = PersonTime(**cells("38", "4,120", "70", "4,090"))
    assert "follow-up-varied" not in told(Outcome(table=timed, follow_up_varied=True))


def test_losses_that_change_nothing_are_not_cautioned(facts):
    """One person lost in each group leaves a clear difference clear."""
    assert "losses-overturn" not in facts(10, 990, 200, 800, first_lost_text="1", second_lost_text="1")


def test_numbers_that_add_up_are_not_cautioned(facts):
    """Those analysed and those lost are those randomised."""
    fields = {"first_randomised_text": "442", "first_lost_text": "30", "second_randomised_text": "409"}
    assert "randomised-differs" not in facts(*TABLE, **fields)
    assert "randomised-differs" in facts(*TABLE, **{**fields, "first_lost_text": "31"})
