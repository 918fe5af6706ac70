"""What stands under the fold: each figure with its numbers, and with what it is not."""

from __future__ import annotations

import msgspec
import pytest

from forms import EVERY_FORM, at_time, effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import EValues, Extras, Figure, Fragility, Gap, Interval
from fourcount.record.paper import Choices
from fourcount.wording.extras import EXTRA_KEYS, extra_lines


def lines_of(outcome):
    return {line.key: line for line in extra_lines(outcome, appraise(outcome, Choices()), Choices())}


def with_extras(extras, outcome=None):
    outcome = outcome or of_total()
    findings = msgspec.structs.replace(appraise(outcome, Choices()), extras=extras)
    return {line.key: line for line in extra_lines(outcome, findings, Choices())}


LOST = of_total(first_lost_text="20", second_lost_text="10")


def test_five_scenarios_of_the_lost_stand_line_by_line():
    """Absolute and relative together; the extremes are called so, and what they overturn is said."""
    ratio = of_total(first_lost_text="20", second_lost_text="10", first_loss_ratio_text="2", second_loss_ratio_text="1")
    lines = lines_of(ratio)
    assert [lines[f"losses.{key}"].name for key in ("none", "all", "worst", "best", "ratio")] == [
        "Lost: nobody had the event",
        "Lost: everybody had the event",
        "Lost: the extreme against the result",
        "Lost: the extreme for the result",
        "Lost: 2 and 1 times the risk of those followed",
    ]
    none, worst = lines["losses.none"], lines["losses.worst"]
    assert (none.detail, none.estimate) == ("16.7% and 8.8%; per 100", "7.9 fewer")
    assert none.note.startswith("risk ratio 0.53 (")
    assert "tells something else about no effect" not in none.note
    assert "tells something else about no effect" in worst.note
    assert all("too narrow" in line.note for key, line in lines.items() if key.startswith("losses."))


def test_fragility_stands_beside_the_number_lost():
    """Its number alone would be read as a measure of the effect, which it is not."""
    line = lines_of(LOST)["fragility"]
    assert (line.estimate, line.interval, line.detail) == ("13", "30 were lost", "night lights")
    assert "does not say how large or how sure the effect is" in line.note
    assert lines_of(of_total())["fragility"].interval == "number lost not typed"


def test_an_e_value_says_whose_it_is_and_what_it_is_not():
    """Of an observational ratio, with that of the limit nearest no effect."""
    line = lines_of(of_total(design="cohort"))["e_value"]
    assert (line.estimate, line.detail, line.interval) == (
        "3.12",
        "of the risk ratio",
        "1.89 for the limit nearest no effect",
    )
    assert "It does not say that there is one" in line.note
    assert "e_value" not in lines_of(of_total())


def test_a_converted_ratio_is_said_to_be():
    """An odds ratio of a common event is turned into a risk ratio first."""
    values = EValues(ratio=4 / 3, estimate=2.0, limit=1.5, converted="odds_ratio", measure="odds_ratio", adjusted=True)
    line = with_extras(Extras(e_value=values))["e_value"]
    assert line.detail == "of the printed, adjusted odds ratio"
    assert line.note.endswith("turned into a risk ratio first, by its square root.")


def test_an_attributable_fraction_may_reach_below_none():
    """Then the exposure may prevent as well, and no event is told to be anybody's."""
    figure = Figure(estimate=0.4, interval=Interval(low=-0.25, high=0.7), method="katz")
    line = with_extras(Extras(attributable_exposed=figure))["attributable_exposed"]
    assert (line.estimate, line.interval) == ("40.0%", "−25 to 70%")
    assert "does not tell whose events" in line.note
    endless = Figure(estimate=0.4, interval=Interval(low=-float("inf"), high=0.7), method="katz")
    assert with_extras(Extras(attributable_exposed=endless))["attributable_exposed"].interval == "below 0% to 70%"


def test_an_attributable_fraction_of_a_cohort_has_an_interval():
    """From the limits of its ratio."""
    line = lines_of(of_total((70, 409, 38, 412), design="cohort"))["attributable_exposed"]
    assert (line.estimate, line.interval) == ("46.1%", "22.2 to 62.8%")


def test_where_the_exposed_fare_better_the_prevented_fraction_stands_alone():
    """No reason why there is no attributable one beside it, and the method in the word of its own ratio."""
    lines = lines_of(of_total(design="cohort"))
    assert "attributable_exposed" not in lines
    line = lines["prevented_exposed"]
    assert (line.estimate, line.interval, line.detail) == ("46.1%", "22.2 to 62.8%", "score")
    assert line.note.startswith("The share of the events expected of the exposed that the exposure prevented")
    assert lines_of(at_time(design="cohort"))["prevented_exposed"].detail == "from the printed limits"
    assert lines_of(strata())["prevented_exposed"].detail == "Mantel–Haenszel"


def test_clusters_show_their_design_effect():
    """With the correlation and the size it follows from."""
    line = lines_of(of_total(icc_text="0.02", cluster_size_text="21"))["clusters"]
    assert (line.estimate, line.detail) == ("1.40", "ICC 0.02, mean size 21")


def test_a_printed_adjusted_effect_stands_apart_in_its_own_digits():
    """With what it was adjusted for; counts cannot give it."""
    line = lines_of(of_total(adjusted_text="0.610 (0.42 to 0.88)", adjusted_for_text="age"))["adjusted"]
    assert (line.name, line.estimate, line.interval) == ("Printed, adjusted odds ratio", "0.610", "0.42 to 0.88")
    assert line.note == "from the paper’s own model, for age; it cannot be checked from the counts"


@pytest.mark.parametrize(
    ("text", "name"),
    [("0.72 (0.55 to 0.92)", "From the printed interval"), ("0.72, p = 0.012", "From the printed p")],
)
def test_a_printed_effect_gives_its_standard_error_and_p(text, name):
    """On the log scale of a ratio; what was rebuilt from a p is approximate."""
    line = lines_of(effect_only("risk_ratio", text))["recovered"]
    assert (line.name, line.estimate) == (name, "p = 0.012")
    assert "on the log scale" in line.note
    assert ("approximate" in line.note) is text.endswith("0.012")


def test_a_reason_takes_the_place_of_a_figure():
    """Under the fold as above it."""
    lines = with_extras(Extras(fragility=Gap("fragility-not-below"), losses=Gap("no-losses")))
    assert lines["fragility"].withheld.startswith("Fisher’s p is not below 0.05")
    assert lines["losses"].withheld.startswith("Nobody is said to be lost")


def test_there_is_nothing_under_the_fold_of_an_empty_table():
    """A quiet page before the first number."""
    assert not lines_of(paired(counts=("", "", "", "")))


@pytest.mark.parametrize("outcome", [*EVERY_FORM.values(), LOST, person_time(), of_total(design="cohort")])
def test_every_line_under_the_fold_has_a_key_of_the_table_and_says_what_it_is_not(outcome):
    """A note or a reason beside each; keys never collide."""
    lines = extra_lines(outcome, appraise(outcome, Choices()), Choices())
    keys = [line.key for line in lines]
    assert len(set(keys)) == len(keys)
    assert set(keys) <= set(EXTRA_KEYS)
    for line in lines:
        assert line.group == "more"
        assert line.withheld or (line.estimate and line.note)


def test_changes_of_fragility_are_whole_people():
    """And name the group that is changed."""
    found = Fragility(changes=1204, group="reference", p_before=0.001, p_after=0.0512, lost=0)
    line = with_extras(Extras(fragility=found))["fragility"]
    assert (line.estimate, line.detail, line.interval) == ("1,204", "usual care", "0 were lost")
    assert "from 0.0010 to 0.051" in line.note
