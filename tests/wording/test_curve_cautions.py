"""The cautions under a curve: those that hold of what it draws, each once."""

from __future__ import annotations

from collections.abc import Callable

import msgspec
import pytest

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.curve import curve
from fourcount.record.outcome import Outcome, Patient
from fourcount.record.paper import Choices
from fourcount.wording.cautions import caution_text
from fourcount.wording.curve import View
from fourcount.wording.curve_cautions import curve_cautions

VIEWS = (View(place=0), View(place=1), View(place=2), View(ratios=True))


def told(outcome: Outcome, view: View) -> tuple[str, ...]:
    findings = appraise(outcome, Choices())
    return curve_cautions(findings, curve(findings), view)


def text_of(outcome: Outcome, key: str) -> str:
    """The sentence of a caution that the outcome's own column has."""
    (found,) = [caution for caution in appraise(outcome, Choices()).cautions if caution.key == key]
    return caution_text(found)


@pytest.mark.parametrize("view", VIEWS)
@pytest.mark.parametrize("effect", ["", "odds_ratio", "risk_difference"])
def test_no_view_says_the_assumption_of_another(outcome_of: Callable[..., Outcome], view: View, effect: str) -> None:
    """That the carried effect is kept, or that a starting risk is bare, is not said again under the curve."""
    outcome = outcome_of(patient=Patient(starting_risk_text="12%", effect=effect))
    assert [caution for caution in appraise(outcome, Choices()).cautions if "kept-constant" in caution.key]
    assert not [text for text in told(outcome, view) if "assumed to be the same" in text or "itself uncertain" in text]


@pytest.mark.parametrize("view", VIEWS)
def test_what_holds_of_the_table_or_the_point_stays(outcome_of: Callable[..., Outcome], view: View) -> None:
    """A distant starting risk is marked in every view; the odds ratio is not the risk ratio in any."""
    outcome = outcome_of((60, 40, 30, 70), patient=Patient(starting_risk_text="5%"))
    assert told(outcome, view) == (text_of(outcome, "odds-ratio-differs"), text_of(outcome, "baseline-far"))


def test_a_caution_of_the_adjusted_effect_stays_with_its_line(outcome_of: Callable[..., Outcome]) -> None:
    """The crude odds ratio shown as a risk ratio is not told that the adjusted one is converted as if crude."""
    outcome = outcome_of(
        design="cohort", adjusted_text="OR 0.60 (0.40 to 0.90)", patient=Patient(starting_risk_text="12%")
    )
    findings = appraise(outcome, Choices())
    drawn = curve(findings)
    sentence = text_of(outcome, "adjusted-converted")
    by_adjusted = {
        line.effect.adjusted: sentence in told(outcome, View(ratios=True, place=place))
        for place, line in enumerate(drawn.ratios)
    }
    assert by_adjusted == {True: True, False: False}
    assert sentence in told(outcome, View(place=drawn.carried))


def test_the_level_of_the_patients_interval_stays_with_its_bar(outcome_of: Callable[..., Outcome]) -> None:
    """Where another line has the band, no interval of the patient's is drawn."""
    outcome = outcome_of(
        design="cohort", adjusted_text="OR 0.60 (90% CI 0.40 to 0.90)", patient=Patient(starting_risk_text="12%")
    )
    drawn = curve(appraise(outcome, Choices()))
    sentence = text_of(outcome, "carried-level")
    assert [sentence in told(outcome, View(place=place)) for place in range(len(drawn.lines))] == [
        place == drawn.carried for place in range(len(drawn.lines))
    ]


def test_what_rests_on_one_starting_risk_is_not_said_of_all(outcome_of: Callable[..., Outcome]) -> None:
    """A curve gives no number needed, and its lines rest on no one starting risk or other time span."""
    sampled = outcome_of(design="case-control", patient=Patient(starting_risk_text="12%"))
    longer = msgspec.structs.replace(
        outcome_of(span_text="1 year"), patient=Patient(starting_risk_text="12%", other_span_text="5 years")
    )
    for outcome, key in ((sampled, "rests-on-baseline"), (longer, "other-span")):
        sentence = text_of(outcome, key)
        assert sentence not in told(outcome, View())
