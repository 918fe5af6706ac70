"""Every text of every form exists, whatever is typed: no exception, no raw value, no verdict."""

from __future__ import annotations

import re

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from drawn_forms import carried_outcomes, count, outcomes
from forms import effect_only, of_total, paired, person_time, strata
from fourcount.appraisal.appraise import appraise
from fourcount.record.paper import FAMILIES, Choices
from fourcount.wording.cautions import caution_text, caution_title
from fourcount.wording.extras import extra_lines
from fourcount.wording.form import opens_more
from fourcount.wording.gaps import mark_text
from fourcount.wording.lines import measure_lines
from fourcount.wording.own_line import own_line_sentence
from fourcount.wording.patient import patient_words
from fourcount.wording.patient_sentence import patient_sentence
from fourcount.wording.patient_table import patient_table, patient_table_head
from fourcount.wording.sentence import headline, measure_sentence, p_sentence
from fourcount.wording.working import PATIENT, working

BANNED = re.compile(r"\b(significan\w*|likely|chance|chances|nan|None|inf|should|recommend\w*)\b")
HOLES = re.compile(r"  | [.,;:]|\(\)|[,;] [,;]|\.\.|…|\([,;]|: ,")
PRINTED_SOURCE = ("Formula", "Source", "Note")  # the methods' own words
NOT_OF_ODDS = re.compile(r"\b(risks?|probability|probable|prevalences?)\b")


def all_texts(outcome, choices, *, with_working):
    """Everything a reader can see of one outcome."""
    findings = appraise(outcome, choices)
    lines = (*measure_lines(outcome, findings, choices), *extra_lines(outcome, findings, choices))
    yield headline(outcome, findings, choices)
    yield p_sentence(findings)
    for line in lines:
        yield from (line.name, line.detail, line.estimate, line.interval, line.note, line.withheld)
        if with_working:
            found = working(line.key, outcome, findings, choices)
            yield from (found.title, found.sentence)
            yield from (text for label, text in found.rows if label not in PRINTED_SOURCE)
    for key in findings.measures:
        yield measure_sentence(key, outcome, findings, choices)
    for caution in findings.cautions:
        yield from (caution_text(caution), caution_title(caution))
    yield from (mark_text(mark) for mark in findings.marks)
    yield own_line_sentence(outcome, findings)
    yield patient_sentence(outcome, findings, choices)
    yield from (cell for row in patient_table(findings, choices) for cell in row)
    yield from patient_table_head(outcome, findings, choices)
    if with_working:
        found = working(PATIENT, outcome, findings, choices)
        yield from (found.title, found.sentence)
        yield from (text for label, text in found.rows if label not in PRINTED_SOURCE)
    words = patient_words(outcome, findings, choices, None)
    for name in words.__slots__:
        value = getattr(words, name)
        yield from (value if isinstance(value, tuple) else (value,))


@settings(max_examples=400)
@given(outcomes(), st.sampled_from(("score", "textbook")), st.sampled_from((0.8, 0.95, 0.999)))
def test_every_text_exists_whatever_is_typed(outcome, family, level):
    """In every form, design and family."""
    for text in all_texts(outcome, Choices(family=family, level=level), with_working=False):
        assert isinstance(text, str)
        assert BANNED.search(text) is None, text
        assert "  " not in text, text
        assert " ." not in text, text
        assert "…" not in text, text


@settings(max_examples=250)
@given(carried_outcomes(), st.sampled_from((0.8, 0.95)))
def test_every_text_of_a_patient_exists_wherever_one_is_carried(outcome, level):
    """Every effect, start and span, with its working; no hole where something was left out."""
    for text in all_texts(outcome, Choices(level=level), with_working=True):
        assert isinstance(text, str)
        assert BANNED.search(text) is None, text
        assert HOLES.search(text) is None, text


@settings(max_examples=120)
@given(outcomes(), st.sampled_from(FAMILIES))
def test_every_working_exists_whatever_is_typed(outcome, family):
    """The same where a line is opened, with the exact family too."""
    for text in all_texts(outcome, Choices(family=family), with_working=True):
        assert isinstance(text, str)
        assert BANNED.search(text) is None, text


@settings(max_examples=80)
@given(st.tuples(count, st.integers(0, 40), st.integers(0, 40), count), st.sampled_from(("paired", "matched")))
def test_a_claim_about_pairs_in_odds_speaks_of_odds_only(cells, design):
    """Cochrane open learning, module 11-7: no risk, chance or probability in it."""
    outcome = paired(design, cells)
    text = headline(outcome, appraise(outcome, Choices()), Choices())
    if text.startswith("Within pairs, the odds"):
        assert not NOT_OF_ODDS.search(text)


@pytest.mark.parametrize(
    ("outcome", "opens"),
    [
        (of_total(), True),
        (strata(), True),
        (paired(), False),
        (effect_only(), False),
        (effect_only(design="cohort"), True),
        (person_time(adjusted_text="0.61 (0.42 to 0.88)"), True),
        (of_total(("", "", "", "")), False),
    ],
)
def test_more_is_offered_only_where_it_opens_something(outcome, opens):
    """The p of a printed interval stands above the fold already."""
    assert opens_more(appraise(outcome, Choices())) == opens
