"""Sentences of the measures: what each says, what it never says, for whatever was typed."""

from __future__ import annotations

import re

import msgspec
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.appraisal.findings import MEASURES, Gap
from fourcount.picture.plan import plan
from fourcount.record.outcome import DESIGNS, Patient
from fourcount.record.paper import FAMILIES, Choices
from fourcount.wording.cautions import caution_text, caution_title
from fourcount.wording.gaps import gap_text, mark_text
from fourcount.wording.lines import measure_lines
from fourcount.wording.meanings import odds_ratio_claim
from fourcount.wording.patient import patient_words
from fourcount.wording.sentence import headline, measure_sentence, p_sentence
from fourcount.wording.working import working

BANNED = re.compile(r"\b(significan\w*|likely|chance|chances|probabl\w*|nan|None|inf|should|recommend\w*)\b")
ONE_IN = re.compile(r"\b1 in (?!1(?:00|0*(?:,000)+)\b)\d")  # 1 in 100 of the same 100 people is a count
NOT_OF_ODDS = re.compile(r"\b(risks?|chances?|probability|probable|likely|prevalences?)\b")
small = st.integers(min_value=0, max_value=40)
cells = small | st.sampled_from((999, 10_000, 374_000, 10**7, 10**9))
texts = st.sampled_from(("", "Usual care", "ACE inhibitor", "{x}", "%s", "12 months", "in 2019", " "))
risks = st.sampled_from(("", "12%", "0%", "100%", "0.01%", "70%", "1 in 1000", "x"))


@st.composite
def situations(draw):
    """Counts and every choice that changes a word."""
    return {
        "counts": tuple(draw(cells) for _ in range(4)),
        "design": draw(st.sampled_from(DESIGNS)),
        "first_label_text": draw(texts),
        "left_words_text": draw(st.sampled_from(("", "fell"))),
        "left_heading_text": draw(texts),
        "span_text": draw(texts),
        "left_welcome": draw(st.booleans()),
        "index_group": draw(st.sampled_from(("first", "second"))),
        "counted": draw(st.sampled_from(("left", "right"))),
        "patient": Patient(starting_risk_text=draw(risks), effect=draw(st.sampled_from(("risk_ratio", "odds_ratio")))),
    }


def all_texts(outcome, findings, choices, *, with_working):
    """Everything a reader can see of one outcome."""
    yield headline(outcome, findings, choices)
    yield p_sentence(findings)
    for line in measure_lines(outcome, findings, choices):
        yield from (line.name, line.detail, line.estimate, line.interval, line.note, line.withheld)
    for key in MEASURES:
        yield measure_sentence(key, outcome, findings, choices)
        if with_working:
            work = working(key, outcome, findings, choices)
            yield from (work.title, work.sentence, *(text for label, text in work.rows if label not in PRINTED_SOURCE))
    for caution in findings.cautions:
        yield from (caution_text(caution), caution_title(caution))
    yield from (mark_text(mark) for mark in findings.marks)
    for denominator in (100, 10_000, None):
        words = patient_words(outcome, findings, choices, denominator)
        for name in words.__slots__:
            value = getattr(words, name)
            yield from (value if isinstance(value, tuple) else (value,))


PRINTED_SOURCE = ("Formula", "Source", "Note")  # the methods' own words, which name probabilities rightly


def check(outcome, findings, choices, *, with_working):
    for text in all_texts(outcome, findings, choices, with_working=with_working):
        assert isinstance(text, str)
        assert BANNED.search(text) is None, text
        assert ONE_IN.search(text) is None, text
        assert "  " not in text, text
        assert " ." not in text, text


@settings(max_examples=150)
@given(situations(), st.sampled_from(("score", "textbook")), st.sampled_from((0.8, 0.95, 0.999)))
def test_every_text_exists_for_every_table(outcome_of, findings_of, situation, family, level):
    """No exception, no raw value, no verdict, whatever the design, the counts and the words."""
    counts = situation.pop("counts")
    outcome, choices = outcome_of(counts, **situation), Choices(family=family, level=level)
    check(outcome, findings_of(outcome, choices), choices, with_working=False)


@settings(max_examples=40)
@given(st.tuples(small, small, small, small), st.sampled_from(DESIGNS), st.sampled_from(FAMILIES))
def test_every_working_exists_for_every_table(outcome_of, findings_of, counts, design, family):
    """The same for the working, with the exact family too."""
    outcome, choices = outcome_of(counts, design=design), Choices(family=family)
    check(outcome, findings_of(outcome, choices), choices, with_working=True)


@settings(max_examples=100)
@given(situations())
def test_a_claim_about_an_odds_ratio_speaks_of_odds_only(outcome_of, findings_of, situation):
    """Cochrane open learning, module 11-7: no risk, chance or probability in it."""
    outcome = outcome_of(situation.pop("counts"), **situation)
    figure = findings_of(outcome).measures["odds_ratio"]
    if isinstance(figure, Gap) or isinstance(figure.estimate, Gap):
        return
    claim = odds_ratio_claim(outcome, figure, Choices())
    assert claim.startswith("The odds that ")
    assert not NOT_OF_ODDS.search(claim)
    if outcome.design == "case-control":
        assert headline(outcome, findings_of(outcome), Choices()) == f"{claim}."


SENTENCES = {
    "risk_difference": (
        "Per 100 people 7.9 fewer fell at least once within 12 months with night lights than with usual care (95%"
        " interval 3.3 to 12.6); per 1,000 that is 79 fewer. These are percentage points, not a percentage of the"
        " risk."
    ),
    "number_needed": (
        "NNTB 13 (95% interval 8 to 31): for every 13 people with night lights rather than with usual care over 12 "
        "months, one fewer fell at least once, on average, from a risk of 17.1% with usual care. It does not say who "
        "it is, nor that the others gain or lose nothing."
    ),
    "risk_index": (
        "38 of 412 people with night lights fell at least once within 12 months: 9.2% (95% interval 6.8 to "
        "12.4%). It is an average of these people, not one person’s own risk."
    ),
    "risk_ratio": (
        "The risk with night lights was 0.54 times that with usual care (95% interval 0.37 to 0.78): a relative "
        "reduction of 46%. By itself it does not say how large the risk is: it was 17.1% with usual care and 9.2%"
        " with night lights."
    ),
    "odds_ratio": (
        "The odds that a person with night lights fell at least once within 12 months were 0.49 times those with "
        "usual care (95% interval 0.32 to 0.75); odds are not risks: at 17.1% this is a risk ratio of 0.54 (0.37 "
        "to 0.78)."
    ),
    "odds_index": (
        "With night lights: 38 with the event to 374 without it, odds of 0.10 (95% interval 0.07 to 0.14). Odds "
        "are events per non-event, not a share of all people."
    ),
}


@pytest.mark.parametrize(("key", "sentence"), SENTENCES.items())
def test_each_measure_says_what_it_means_and_what_it_is_not(outcome_of, findings_of, key, sentence):
    """One plain reading beside every figure, with its interval in the same sentence."""
    outcome = outcome_of()
    assert measure_sentence(key, outcome, findings_of(outcome), Choices()) == sentence


EQUAL = {
    "risk_difference": (
        "Per 100 people as many fell at least once within 12 months with night lights as with usual care (95% interval "
        "8.8 fewer to 8.8 more)."
    ),
    "number_needed": (
        "Both groups had the event equally often, so no number of people makes a difference of one (95% interval NNTB "
        "12 to ∞ to NNTH 12). An interval through infinity is compatible with one fewer and with one more."
    ),
    "risk_ratio": (
        "The risk with night lights was 1.00 times that with usual care (95% interval 0.44 to 2.25). By itself it does "
        "not say how large the risk is: it was 10.0% with usual care and 10.0% with night lights."
    ),
}


@pytest.mark.parametrize(("key", "sentence"), EQUAL.items())
def test_equal_groups_are_neither_fewer_nor_more(outcome_of, findings_of, key, sentence):
    """A difference of 0 has an interval and no side."""
    outcome = outcome_of((10, 90, 10, 90))
    assert measure_sentence(key, outcome, findings_of(outcome), Choices()) == sentence


def test_a_number_needed_through_infinity_says_what_that_is_compatible_with(outcome_of, findings_of):
    """Beside the interval itself."""
    outcome = outcome_of((12, 88, 10, 90))
    sentence = measure_sentence("number_needed", outcome, findings_of(outcome), Choices())
    assert "The interval runs through infinity: compatible with one fewer and with one more." in sentence


def test_a_figure_without_estimate_gives_the_reason_and_its_interval(outcome_of, findings_of):
    """0/0 has an interval and no value."""
    outcome = outcome_of((0, 50, 0, 40))
    assert measure_sentence("risk_ratio", outcome, findings_of(outcome), Choices()) == (
        "Nobody in either group had the event, so this figure is not determined. Its 95% interval is 0 to ∞."
    )


def test_a_survey_speaks_of_prevalence(outcome_of, findings_of):
    """No risk is found at one moment."""
    outcome = outcome_of(design="survey")
    findings = findings_of(outcome)
    for key in ("risk_index", "risk_ratio", "odds_ratio", "risk_difference"):
        sentence = measure_sentence(key, outcome, findings, Choices())
        assert not re.search(r"\brisks?\b", sentence)


def test_the_p_value_names_its_test(outcome_of, findings_of):
    """An exact p with its method, and no verdict from it."""
    outcome = outcome_of((12, 88, 10, 90))
    assert p_sentence(findings_of(outcome)) == (
        "p = 0.65, two-sided (N−1 chi-square). It does not say how large the effect is; the intervals do."
    )


def test_a_number_needed_without_one_limit_says_why(outcome_of, findings_of):
    """Wald's difference of 9/10 v 1/10 passes 100 in 100, where no number needed is."""
    outcome, choices = outcome_of((9, 1, 1, 9)), Choices(family="textbook")
    sentence = measure_sentence("number_needed", outcome, findings_of(outcome, choices), choices)
    assert sentence.startswith("NNTH 2 (95% interval up to 2; the other limit is not given): ")
    assert sentence.endswith(gap_text(Gap("formula-beyond-risks")))


@pytest.mark.parametrize(("design", "supposed"), [("trial", False), ("cohort", True), ("case-control", True)])
def test_without_randomisation_a_number_needed_supposes_a_cause(outcome_of, findings_of, design, supposed):
    """In the study's sentence and in the patient's."""
    outcome = outcome_of(design=design, patient=Patient(starting_risk_text="12%"))
    findings = findings_of(outcome)
    told = [patient_words(outcome, findings, Choices(), 100).detail]
    if design != "case-control":
        told.append(measure_sentence("number_needed", outcome, findings, Choices()))
    assert [supposed] * len(told) == ["if the difference is caused by it" in text for text in told]


def test_a_p_that_follows_says_so(outcome_of, findings_of):
    """The reader waits for it, and is told that there will be one."""
    findings = findings_of(outcome_of())
    waiting = msgspec.structs.replace(findings, test=msgspec.structs.replace(findings.test, p=Gap("follows")))
    assert p_sentence(waiting) == "The p value takes a moment and will follow."


@pytest.mark.parametrize("family", FAMILIES)
def test_an_outcome_that_all_share_has_no_p(outcome_of, findings_of, family):
    """Where nobody, or everybody, had the event there is nothing to test, and no p stands anywhere."""
    none, everybody = (outcome_of(cells) for cells in ((0, 50, 0, 50), (50, 0, 50, 0)))
    assert p_sentence(findings_of(none, Choices(family=family))) == (
        "There is no p: nobody in either group had the event, so this figure is not determined."
    )
    assert p_sentence(findings_of(everybody, Choices(family=family))) == (
        "There is no p: everybody in both groups had the event, so this figure is not determined."
    )


@given(st.floats(min_value=0, max_value=1), st.floats(min_value=0, max_value=1))
def test_the_picture_and_the_words_take_the_same_denominator(without, with_):
    """Whatever the plan chooses, it is a number of people that the words know."""
    assert plan(without, with_).denominator in (100, 1_000, 10_000, None)
