"""Properties of the findings over arbitrary tables, designs, families and starting risks."""

from __future__ import annotations

import math

from hypothesis import assume, example, given
from hypothesis import strategies as st

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.cautions import CAUTIONS
from fourcount.appraisal.findings import GAP_KEYS, MEASURES, Figure, Gap, Interval, NumberNeeded
from fourcount.record.outcome import DESIGNS, EventsAndOthers, Outcome, Patient
from fourcount.record.paper import FAMILIES, Choices
from fourcount.stats.results import GAP_KEYS as NUMBER_GAP_KEYS
from held import everything

KNOWN_GAPS = set(GAP_KEYS) | set(NUMBER_GAP_KEYS)
KNOWN_CAUTIONS = [rule.key for rule in CAUTIONS]

small = st.integers(0, 60) | st.sampled_from([0, 1, 2])
large = small | st.integers(0, 10**9) | st.just(10**9)
risks = st.sampled_from(["", "0%", "0.0001%", "1%", "12%", "50%", "99.9%", "100%", "not a risk"])


def tables(cells):
    """Four cells."""
    return st.tuples(cells, cells, cells, cells)


@st.composite
def questions(draw):
    """An outcome and its choices; the exact family on tables it answers quickly."""
    family = draw(st.sampled_from(FAMILIES))
    cells = draw(tables(small if family == "exact" else large))
    return outcome(
        cells,
        design=draw(st.sampled_from(DESIGNS)),
        left_welcome=draw(st.booleans()),
        index_group=draw(st.sampled_from(["first", "second"])),
        counted=draw(st.sampled_from(["left", "right"])),
        patient=Patient(starting_risk_text=draw(risks), effect=draw(st.sampled_from(["risk_ratio", "odds_ratio"]))),
    ), Choices(family=family, level=draw(st.sampled_from([0.8, 0.95, 0.999])))


def outcome(cells, **rest):
    """An outcome of four whole numbers."""
    a, b, c, d = map(str, cells)
    table = EventsAndOthers(first_left_text=a, first_right_text=b, second_left_text=c, second_right_text=d)
    return Outcome(table=table, **rest)


@given(questions())
@example((outcome((0, 0, 0, 0), patient=Patient(starting_risk_text="0%")), Choices()))
@example((outcome((10**9,) * 4, patient=Patient(starting_risk_text="100%", effect="odds_ratio")), Choices()))
def test_whatever_is_typed_every_figure_is_a_number_or_a_reason(question):
    """No nan anywhere; every gap's key is known; measures, and the cautions' keys, are in their order."""
    findings = appraise(*question)
    held = list(everything(findings))
    assert [part for part in held if isinstance(part, float) and math.isnan(part)] == []
    assert set() == {part.key for part in held if isinstance(part, Gap)} - KNOWN_GAPS
    assert list(MEASURES) == list(findings.measures)
    places = [KNOWN_CAUTIONS.index(caution.key) for caution in findings.cautions]
    assert sorted(places) == places


@given(questions())
@example(
    # The odds ratio's limits, 1.1e16 and 1.2e17, are the same risk ratio to the last bit at 99.9%.
    (outcome((4, 10**9, 10**9, 7), counted="right", patient=Patient(starting_risk_text="99.9%")), Choices())
)
def test_every_interval_is_in_order_and_a_measure_has_both_limits(question):
    """The lower limit is never above the upper one; risks lie between 0 and 1."""
    findings = appraise(*question)
    for part in everything(findings):
        if isinstance(part, Interval):
            assert part.low <= part.high
    for measure in findings.measures.values():
        if isinstance(measure, Figure):
            assert isinstance(measure.interval, Interval | Gap)
            assert not (isinstance(measure.estimate, Gap) and isinstance(measure.interval, Gap))
    if not isinstance(findings.patient, Gap):
        for figure in (findings.patient.without, findings.patient.with_):
            assert isinstance(figure.estimate, Gap) or 0 <= figure.estimate <= 1
            if not isinstance(figure.interval, Gap):
                limits = (figure.interval.low, figure.interval.high)
                assert all(isinstance(limit, Gap) or 0 <= limit <= 1 for limit in limits)


@given(tables(large))
def test_the_default_family_speaks_with_one_voice(cells):
    """Difference, ratio, odds ratio and p of the score family never disagree about no effect."""
    assume(cells[0] + cells[1] and cells[2] + cells[3])
    findings = appraise(outcome(cells), Choices())
    p = findings.test.p
    assume(isinstance(p, Gap) or abs(p - 0.05) > 1e-9)
    voices = set() if isinstance(p, Gap) else {p < 0.05}
    for key, no_effect in (("risk_difference", 0), ("risk_ratio", 1), ("odds_ratio", 1)):
        interval = findings.measures[key].interval
        voices.add(interval.low > no_effect or interval.high < no_effect)
    assert len(voices) == 1
    assert "family-parts" not in {caution.key for caution in findings.cautions}


def near(one, other):
    """Equal to ten digits, infinities and zeros included."""
    return one == other or math.isclose(one, other, rel_tol=1e-9, abs_tol=1e-12)


def agree(figure, mirrored, turn):
    """Whether one figure is the other through a decreasing function."""
    if isinstance(figure, Gap) or isinstance(mirrored, Gap):
        return figure == mirrored
    if isinstance(figure.estimate, Gap) or isinstance(mirrored.estimate, Gap):
        estimates = figure.estimate == mirrored.estimate
    else:
        estimates = near(figure.estimate, turn(mirrored.estimate))
    if isinstance(figure.interval, Gap) or isinstance(mirrored.interval, Gap):
        return estimates and figure.interval == mirrored.interval
    low, high = turn(mirrored.interval.high), turn(mirrored.interval.low)
    return estimates and near(figure.interval.low, low) and near(figure.interval.high, high)


def reciprocal(value):
    """1/x with its ends."""
    return math.inf if value == 0 else 1 / value


@given(tables(st.integers(1, 60)), st.sampled_from(FAMILIES))
def test_swapping_the_groups_turns_every_comparison(cells, family):
    """With the other group as index the difference changes its sign, ratios are reciprocals, the p stays."""
    one, other = (appraise(outcome(cells, index_group=group), Choices(family=family)) for group in ("first", "second"))
    assert agree(one.measures["risk_difference"], other.measures["risk_difference"], lambda value: -value)
    assert agree(one.measures["risk_ratio"], other.measures["risk_ratio"], reciprocal)
    assert agree(one.measures["odds_ratio"], other.measures["odds_ratio"], reciprocal)
    assert one.measures["risk_index"] == other.measures["risk_reference"]
    assert near(one.test.p, other.test.p)
    keys = [{caution.key for caution in findings.cautions} for findings in (one, other)]
    assert ("odds-ratio-differs" in keys[0]) == ("odds-ratio-differs" in keys[1])


@given(tables(st.integers(1, 60)), st.sampled_from(FAMILIES))
def test_counting_the_other_outcome_turns_the_odds_ratio(cells, family):
    """With the other outcome counted its ratio takes the place of the event's, and the number needed stays."""
    one, other = (appraise(outcome(cells, counted=column), Choices(family=family)) for column in ("left", "right"))
    assert one.measures["other_risk_ratio"] == other.measures["risk_ratio"]
    assert one.measures["risk_ratio"] == other.measures["other_risk_ratio"]
    assert agree(one.measures["odds_ratio"], other.measures["odds_ratio"], reciprocal)
    assert agree(one.measures["risk_difference"], other.measures["risk_difference"], lambda value: -value)
    needed, again = one.measures["number_needed"], other.measures["number_needed"]
    if isinstance(needed, NumberNeeded) and one.measures["risk_difference"].estimate != 0:
        assert needed.kind == again.kind
        assert near(needed.estimate, again.estimate)


@given(tables(st.integers(1, 60)), st.sampled_from(["risk_ratio", "odds_ratio"]))
def test_the_effect_at_the_tables_own_risk_gives_the_tables_risk(cells, effect):
    """Carried to the reference group's own risk, typed in full, either effect gives the index group's risk."""
    a, b, c, d = cells
    patient = Patient(starting_risk_text=f"{c} in {c + d}", effect=effect)
    findings = appraise(outcome(cells, patient=patient), Choices())
    assert near(a / (a + b), findings.patient.with_.estimate)
