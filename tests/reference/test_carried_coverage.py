"""Facts about the coverage of carried figures that a short simulation with a fixed seed already shows."""

from __future__ import annotations

import pytest

from reference_command import reference_command

carried = reference_command("carried_coverage")

DRAWS = 600


def point(effect: str, value: float) -> object:
    return carried.Point(effect=effect, value=value, reference_risk=0.3, people=400, start=0.2, start_people=100)


@pytest.mark.parametrize(("effect", "value"), [("risk_ratio", 0.8), ("odds_ratio", 0.5), ("hazard_ratio", 1.5)])
def test_propagated_ranges_keep_their_level(effect: str, value: float) -> None:
    """The propagated range holds the true difference about as often as its level says."""
    found = carried.coverage(point(effect, value), "counted", DRAWS)
    assert found.none == 0
    assert 0.925 < found.held < 0.98


@pytest.mark.parametrize("start", ["printed, exact", "printed, Wald", "printed, logit"])
def test_printed_limits_of_a_starting_risk_do_too(start: str) -> None:
    """Whichever interval a paper prints of the starting risk, the range stays near its level."""
    found = carried.coverage(point("risk_ratio", 0.5), start, DRAWS)
    assert 0.925 < found.held < 0.985


def test_a_starting_risk_taken_as_certain_covers_too_seldom() -> None:
    """With few people behind the starting risk and a large effect, leaving its imprecision out is far off."""
    sharp = carried.Point(
        effect="risk_ratio", value=0.5, reference_risk=0.3, people=2000, start=0.2, start_people=50
    )  # fmt: skip
    assert carried.coverage(sharp, "as if certain", DRAWS).held < 0.75
    assert carried.coverage(sharp, "counted", DRAWS).held > 0.925


def test_propagating_a_table_with_itself_is_wrong() -> None:
    """From the study's own reference group the two estimates hang together, and the range no longer keeps its level."""
    helpful, harmful = (
        carried.Point(effect="risk_ratio", value=value, reference_risk=0.5, people=400, start=0.5, start_people=400)
        for value in (0.5, 1.5)
    )
    found = [carried.coverage(one, "counted", DRAWS, own=True).held for one in (helpful, harmful)]
    assert max(found) > 0.975 or min(found) < 0.92
