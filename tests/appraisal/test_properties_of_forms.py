"""Properties of the findings over arbitrary text in every field of every form."""

from __future__ import annotations

import math

from hypothesis import example, given
from hypothesis import strategies as st

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.cautions import CAUTIONS
from fourcount.appraisal.findings import (
    EFFECT_MEASURES,
    GAP_KEYS,
    MEASURES,
    PAIR_MEASURES,
    POOLED_MEASURES,
    RATE_MEASURES,
    TIMED_MEASURES,
    Figure,
    Gap,
    Interval,
    StrataFindings,
)
from fourcount.record.outcome import (
    CELLS,
    COUNTED_FORMS,
    DESIGNS,
    FORMS,
    PAPER_MEASURES,
    WHERE,
    EffectOnly,
    Outcome,
    Patient,
    PersonTime,
    RiskAtTime,
    Strata,
    Stratum,
    form_of,
)
from fourcount.record.paper import FAMILIES, Choices
from fourcount.stats.results import GAP_KEYS as NUMBER_GAP_KEYS
from held import everything

KNOWN_GAPS = set(GAP_KEYS) | set(NUMBER_GAP_KEYS)
KEYS = {
    **dict.fromkeys((*COUNTED_FORMS, "strata"), MEASURES),
    "pairs": PAIR_MEASURES,
    "person-time": RATE_MEASURES,
    "risk-at-time": TIMED_MEASURES,
}

counts = st.integers(0, 60).map(str) | st.sampled_from(["", "0", "0", "1", "38/412", "38 (9.2%)", "1,204", "-3", "x"])
percents = st.sampled_from(["9.2%", "0%", "100%", "50", "0.5", "<1%", "9,2 %", "17.1% of 409", "101%"])
times = st.sampled_from(["4,120", "0", "0.5", "12.5 years", "10 person-years", "-1", "1000000000000"])
risks = st.sampled_from(["9%", "9% (6 to 12)", "0%", "0% (0 to 3%)", "100%", "100% (97 to 100)", "0.09", "9 in 100"])
limits = st.sampled_from(["6 to 12", "12 to 6", "0-3%", "97 to 100", "", "0.1 to 0.2", "0 to 100"])
anything = st.text(max_size=12)
cells = st.one_of(counts, counts, counts, percents, times, risks, limits, anything)
amounts = st.sampled_from(["", "", "", "0", "1", "5", "30", "0.05", "1.5", "2", "1e9", "1000000000", "-1", "x", "100%"])
papers = anything | st.sampled_from(
    [
        "",
        "OR 0.49 (0.32 to 0.75)",
        "RR 0, P = 0.03",
        "HR 0.72 [90% CI, 0.55–0.92]",
        "risk difference 7.9 percentage points (3.3 to 12.6)",
        "risk difference -300%",
        "RR 1 (1 to 1)",
        "RR 1.0, P = 1.0",
        "OR 0.5 (0 to 0.9)",
        "OR 0.5 (0.9 to 0.3)",
        "0.54, P < 0.001",
        "rate ratio 2.1 (1.1 to 4.0)",
        "rate difference 3 per 1000 (1 to 5)",
        "aOR 2.3; 90% CI 1.1, 4.8",
        "RR -2",
        "P = 0.03",
        "RR 1000000000000000000000 (1 to 2)",
        "RR 0.5, P = 0.0000000000001",
    ]
)


@st.composite
def tables(draw):
    """A table of any form with any text in it; half of them with texts that belong there."""
    form = draw(st.sampled_from([*FORMS]))
    if form == "effect-only":
        return EffectOnly()
    if form == "strata":
        rows = draw(st.lists(st.tuples(*[counts] * 4) | st.tuples(*[cells] * 4), max_size=4))
        strata = tuple(Stratum(label_text=draw(anything), **dict(zip(CELLS, row, strict=True))) for row in rows)
        return Strata(strata=strata, of_total=draw(st.booleans()))
    own = {"percent-of-total": (percents, counts), "person-time": (counts, times), "risk-at-time": (risks, limits)}
    left, right = own.get(form, (counts, counts))
    texts = draw(st.tuples(left, right, left, right) | st.tuples(*[cells] * 4))
    table = FORMS[form](**dict(zip(CELLS, texts, strict=True)))
    if isinstance(table, PersonTime):
        return PersonTime(**dict(zip(CELLS, texts, strict=True)), unit_text=draw(anything))
    if isinstance(table, RiskAtTime):
        level = draw(st.sampled_from(["", "90%", "x"]))
        return RiskAtTime(**dict(zip(CELLS, texts, strict=True)), limits_level_text=level)
    return table


outcomes = st.builds(
    Outcome,
    table=tables(),
    design=st.sampled_from(DESIGNS),
    left_welcome=st.booleans(),
    index_group=st.sampled_from(["first", "second"]),
    counted=st.sampled_from(["left", "right"]),
    patient=st.builds(
        Patient,
        starting_risk_text=st.sampled_from(["", "0%", "0.0001%", "12%", "50%", "100%", "not a risk"]),
        effect=st.sampled_from(["risk_ratio", "odds_ratio"]),
    ),
    counting=st.sampled_from(["people", "people", "people", "events"]),
    follow_up_varied=st.booleans(),
    where=st.sampled_from(WHERE),
    paper_measure=st.sampled_from(PAPER_MEASURES),
    paper_text=papers,
    adjusted_measure=st.sampled_from(PAPER_MEASURES),
    adjusted_text=st.just("") | papers,
    adjusted_for_text=st.sampled_from(["", "age"]),
    first_randomised_text=amounts,
    second_randomised_text=amounts,
    first_lost_text=amounts,
    second_lost_text=amounts,
    first_loss_ratio_text=amounts,
    second_loss_ratio_text=amounts,
    icc_text=st.just("") | amounts,
    cluster_size_text=st.just("") | amounts,
)
choices = st.builds(Choices, family=st.sampled_from(FAMILIES), level=st.sampled_from([0.8, 0.95, 0.999]))


@given(outcomes, choices)
@example(Outcome(table=EffectOnly(), paper_text="RR 0 (0 to 0.5)", index_group="second"), Choices())
@example(Outcome(table=Strata(strata=())), Choices())
def test_whatever_is_typed_every_form_gives_numbers_or_reasons(outcome, choices):
    """Nothing raises, nothing is nan, every gap and caution is a known one, limits are in order."""
    findings = appraise(outcome, choices)
    held = list(everything(findings))
    assert [part for part in held if isinstance(part, float) and math.isnan(part)] == []
    assert set() == {part.key for part in held if isinstance(part, Gap)} - KNOWN_GAPS
    assert [part for part in held if isinstance(part, Interval) and not part.low <= part.high] == []
    places = [[rule.key for rule in CAUTIONS].index(caution.key) for caution in findings.cautions]
    assert sorted(places) == places


@given(outcomes, choices)
def test_every_form_has_its_own_measures(outcome, choices):
    """The keys are those of the form and in their order; a figure has an estimate or an interval."""
    findings = appraise(outcome, choices)
    assert findings.form == form_of(outcome.table)
    if findings.form == "effect-only":
        assert len(findings.measures) == 1
        assert set(findings.measures) <= set(EFFECT_MEASURES)
    else:
        assert tuple(findings.measures) == KEYS[findings.form]
    for measure in findings.measures.values():
        if isinstance(measure, Figure):
            assert not (isinstance(measure.estimate, Gap) and isinstance(measure.interval, Gap))
    if isinstance(findings.strata, StrataFindings):
        assert tuple(findings.strata.pooled) == POOLED_MEASURES
    assert (findings.strata is not None) == (findings.form == "strata")


@given(outcomes, choices)
def test_deferring_only_leaves_out(outcome, choices):
    """What a keystroke shows is what follows, but for figures that are said to follow."""
    now, later = appraise(outcome, choices, deferring=True), appraise(outcome, choices)
    assert now.given == later.given
    assert now.marks == later.marks
    assert now.cautions == later.cautions or "follows" in repr(now)
