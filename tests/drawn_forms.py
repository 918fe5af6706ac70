"""Outcomes of every form drawn at random, with whatever may be typed beside a table."""

from __future__ import annotations

from hypothesis import strategies as st

from forms import at_time, effect_only, of_total, paired, person_time, strata
from fourcount.record.outcome import (
    DESIGNS,
    EFFECTS,
    LINE_KINDS,
    LINE_SCALES,
    LINE_SIDES,
    PAPER_MEASURES,
    START_KINDS,
    Patient,
)

count = st.integers(0, 40) | st.sampled_from((10**5, 10**9)) | st.just("")
time = st.sampled_from(("10", "4,120", "0.5", "0", "10^9", "4,120 days", "", "x")) | st.integers(1, 10**6)
percentage = st.sampled_from(("0%", "9.2%", "17.1%", "100%", "99.97%", "", "x"))
bounds = st.sampled_from(("6 to 12", "0-30%", "13.8 to 21.1", "90 to 100", "12 to 6", ""))
effects = st.sampled_from((
    "0.72 (0.55 to 0.92)", "1.0 (1.0 to 1.0)", "0 (0 to 3)", "2; 90% CI 0.9, 4.8; p = 0.08", "1.5, p < 0.001", "3",
    "-7.9% (-12 to 2)", "1.5, p = 0.03", "aOR 2.3 (1.1 to 4.8)", "x", "0.72 (0.92 to 0.55)", "12 per 1000 (3 to 20)",
))  # fmt: skip
labels = st.sampled_from(("", "ACE inhibitor", "{x}", "%s", " "))
spans = st.sampled_from(("", "5 years", "1 day", "0 years", "x"))
risks = st.sampled_from(("", "12%", "0%", "100%", "x", "24 of 200", "12% (9 to 15)", "0 of 30", "0.001%", "99%"))
small = st.sampled_from(("", "0", "5", "30", "x"))


@st.composite
def patients(draw):
    """Whatever may be typed of one patient, in any way of giving the starting risk."""
    return Patient(
        start_kind=draw(st.sampled_from(START_KINDS)),
        starting_risk_text=draw(risks),
        low_risk_text=draw(st.sampled_from(("", "5%", "0%", "40%", "x"))),
        high_risk_text=draw(st.sampled_from(("", "30%", "100%", "2%", "x"))),
        rate_text=draw(st.sampled_from(("", "12 per 1,000 person-years", "0.4/month", "0 per year", "x"))),
        overall_risk_text=draw(st.sampled_from(("", "12%", "0%", "100%", "x"))),
        exposed_share_text=draw(st.sampled_from(("", "30%", "0%", "100%", "x"))),
        starting_risk_source_text=draw(st.sampled_from(("", "a {register}"))),
        other_span_text=draw(spans),
        effect=draw(st.sampled_from(EFFECTS)),
    )


@st.composite
def common(draw):
    """Whatever a table of any form may have beside its numbers."""
    return {
        "design": draw(st.sampled_from(DESIGNS)),
        "first_label_text": draw(labels),
        "left_words_text": draw(st.sampled_from(("", "fell"))),
        "span_text": draw(st.sampled_from(("", "2 years", "at 5 years"))),
        "left_welcome": draw(st.booleans()),
        "index_group": draw(st.sampled_from(("first", "second"))),
        "counted": draw(st.sampled_from(("left", "right"))),
        "follow_up_varied": draw(st.booleans()),
        "counting": draw(st.sampled_from(("people", "events"))),
        "where": draw(st.sampled_from(("", "abstract"))),
        "adjusted_text": draw(st.sampled_from(("", "0.61 (0.42 to 0.88)", "x"))),
        "adjusted_for_text": draw(st.sampled_from(("", "age and {sex}"))),
        "first_lost_text": draw(small),
        "second_lost_text": draw(small),
        "first_randomised_text": draw(st.sampled_from(("", "450"))),
        "icc_text": draw(st.sampled_from(("", "0.02", "2", "x"))),
        "patient": draw(patients()),
        "line_kind": draw(st.sampled_from(LINE_KINDS)),
        "line_scale": draw(st.sampled_from(LINE_SCALES)),
        "line_side": draw(st.sampled_from(LINE_SIDES)),
        "line_text": draw(st.sampled_from(("", "5 per 100", "0.8", "1.2", "x"))),
        "cluster_size_text": draw(st.sampled_from(("", "21"))),
    }


@st.composite
def outcomes(draw):
    """One outcome of any form but four counts as ``38 · 374``, which other tests draw."""
    fields, four = draw(common()), st.tuples(count, count, count, count)
    return draw(
        st.one_of(
            st.builds(lambda cells: of_total(cells, **fields), four),
            st.builds(lambda cells: paired(counts=cells, **fields), four),
            st.builds(lambda cells: person_time(cells, **fields), st.tuples(count, time, count, time)),
            st.builds(lambda cells: at_time(cells, **fields), st.tuples(percentage, bounds, percentage, bounds)),
            st.builds(
                lambda measure, text: effect_only(measure, text, **fields),
                st.sampled_from(PAPER_MEASURES),
                effects,
            ),
            st.builds(
                lambda rows: strata(rows=[(f"row {i}", *row) for i, row in enumerate(rows)], **fields),
                st.lists(st.tuples(count, count, count, count), max_size=4),
            ),
        )
    )


whole_tables = st.sampled_from(
    (
        of_total,
        lambda **f: of_total((0, 50, 7, 50), **f),
        lambda **f: of_total((50, 50, 1, 999), **f),
        lambda **f: of_total((30, 100, 30, 100), **f),
        paired,
        lambda **f: paired("matched", **f),
        lambda **f: paired("before-after", ("", 20, 40, ""), **f),
        person_time,
        at_time,
        strata,
        lambda **f: strata("case-control", **f),
        lambda **f: of_total(**{**f, "design": "case-control"}),
        lambda **f: of_total(**{**f, "design": "survey"}),
        lambda **f: effect_only("hazard_ratio", **f),
        lambda **f: effect_only("odds_ratio", "2.4; 90% CI 0.9, 4.8", **f),
        lambda **f: effect_only("risk_ratio", "1.9 (1.2 to 3.1)", **f),
        lambda **f: effect_only("risk_difference", "-7.9% (-12.6 to -3.3)", **f),
    )
)


@st.composite
def carried_outcomes(draw):
    """Tables that hold together, and starting risks that can be read: what is typed of a patient comes to something."""
    readable = st.sampled_from(("", "12%", "0%", "100%", "24 of 200", "12% (9 to 15)", "0 of 30", "0.001%", "70%"))
    patient = Patient(
        start_kind=draw(st.sampled_from(START_KINDS)),
        starting_risk_text=draw(readable),
        low_risk_text=draw(st.sampled_from(("", "0.01%", "0%"))),
        high_risk_text=draw(st.sampled_from(("", "80%", "100%"))),
        rate_text=draw(st.sampled_from(("12 per 1,000 person-years", "0.4/month", "0 per year"))),
        overall_risk_text=draw(st.sampled_from(("12%", "0%", "60%"))),
        exposed_share_text=draw(st.sampled_from(("30%", "0%", "100%"))),
        other_span_text=draw(st.sampled_from(("", "", "5 years", "1 day"))),
        effect=draw(st.sampled_from(EFFECTS)),
    )
    fields = {
        "patient": patient,
        "left_welcome": draw(st.booleans()),
        "index_group": draw(st.sampled_from(("first", "second"))),
        "counted": draw(st.sampled_from(("left", "right"))),
        "adjusted_text": draw(st.sampled_from(("", "OR 0.61 (90% CI 0.42 to 0.88)", "HR 2.0 (1.1 to 3.6)"))),
    }
    return draw(whole_tables)(**fields)
