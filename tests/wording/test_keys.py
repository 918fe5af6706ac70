"""Every key that can reach a reader has its sentence."""

from __future__ import annotations

import re

import pytest

from fourcount.appraisal.cautions import CAUTIONS
from fourcount.appraisal.findings import GAP_KEYS as APPRAISAL_KEYS
from fourcount.appraisal.findings import Caution
from fourcount.record.entry.cell import read_cell
from fourcount.record.entry.level import read_level
from fourcount.record.entry.printed import PAPER_MARKS
from fourcount.record.entry.readings import Mark, Unreadable
from fourcount.record.entry.risk import read_risk
from fourcount.stats.results import GAP_KEYS, Gap
from fourcount.wording import cautions, gaps
from fourcount.wording.facts import LONGEST_QUOTE

MARK_KEYS = (
    *PAPER_MARKS,
    "percent-several",
    "percent-none",
    "percent-below",
    "not-a-percent",
    "not-a-time",
    "negative-time",
    "time-disagrees",
    "units-differ",
    "not-limits",
    "limits-disordered",
    "not-an-amount",
    "negative-amount",
    "icc-out-of-range",
    "cluster-too-small",
    "not-a-count",
    "negative",
    "decimal",
    "point-in-thousands",
    "two-counts",
    "too-large",
    "events-above-total",
    "total-disagrees",
    "percent-disagrees",
    "read-as",
    "not-a-risk",
    "percent-or-fraction",
    "risk-out-of-range",
    "not-a-level",
    "level-out-of-range",
    "risk-unlike-percent",
    "limits-need-sign",
    "risk-of-nobody",
    "share-of-nobody",
    "share-of-everybody",
    "risk-of-everybody",
    "low-above-high",
    "high-below-low",
    "low-above-usual",
    "high-below-usual",
    "not-a-share",
    "share-out-of-range",
    "not-a-rate",
    "rate-without-time",
    "negative-rate",
    "not-a-duration",
    "duration-without-unit",
    "duration-not-above-zero",
    "duration-too-long",
    "not-a-margin",
    "not-a-ratio",
    "margin-no-effect",
    "margin-out-of-range",
    "ratio-out-of-range",
    "margin-not-fewer",
    "margin-not-more",
    "ratio-not-fewer",
    "ratio-not-more",
)
FACTS = {
    "text": "38 (9.9%)",
    "events": 38,
    "label": "placebo",
    "total": 412,
    "odds_ratio": 0.4921,
    "risk_ratio": 0.5389,
    "effect": "risk_ratio",
    "value": 0.5389,
    "baseline": 0.12,
    "study": 70 / 409,
    "design": "cohort",
    "count": 1,
    "measure": "odds_ratio",
    "risk": 0.004,
    "side": "more",
}


@pytest.mark.parametrize("key", [*GAP_KEYS, *APPRAISAL_KEYS])
def test_every_reason_for_no_figure_has_a_sentence(key):
    """Each ends as a sentence does and is its own."""
    text = gaps.gap_text(Gap(key))
    assert text != gaps.UNKNOWN_GAP
    assert text.endswith(".")
    assert text[0].isupper()


def test_no_sentence_outlives_its_reason():
    """Every sentence belongs to a key that can still occur."""
    assert set(gaps.GAP_TEXTS) == {*GAP_KEYS, *APPRAISAL_KEYS}
    assert set(gaps.MARK_TEXTS) == set(MARK_KEYS)
    assert set(cautions.TEXTS) == {rule.key for rule in CAUTIONS}


@pytest.mark.parametrize("key", MARK_KEYS)
def test_every_mark_quotes_what_was_typed_and_says_what_is_wrong(key):
    """``-3: a count cannot be negative``."""
    text = gaps.mark_text(Mark(field="", key=key, facts={"text": "-3"}))
    assert text.startswith("-3: ")
    assert text != gaps.mark_text(Mark(field="", key="?", facts={"text": "-3"}))


@pytest.mark.parametrize(
    ("read", "typed"),
    [
        (read_cell, "-3"),
        (read_cell, "3.5"),
        (read_cell, "9" * 12),
        (read_cell, "9/3"),
        (read_cell, "none"),
        (read_risk, "often"),
        (read_risk, "0.12"),
        (read_risk, "120%"),
        (read_level, "high"),
        (read_level, "50"),
    ],
)
def test_what_the_entry_cannot_read_is_explained(read, typed):
    """The keys that reading really gives are the ones that have sentences."""
    reading = read(typed)
    assert isinstance(reading, Unreadable)
    assert reading.key in MARK_KEYS
    assert gaps.mark_text(reading).startswith(f"{typed}: ")


def test_a_negative_count_is_refused_in_so_many_words():
    """The sentence names what is wrong."""
    assert gaps.mark_text(Mark(field="", key="negative", facts={"text": "-3"})) == "-3: a count cannot be negative"


def test_a_refusal_says_what_would_do():
    """A point before thousands is met with the comma, and two counts with a cell for each."""
    say = {text: gaps.mark_text(read_cell(text)) for text in ("1.204", "1.204.567", "1.20", "38, 374", "38\t374")}
    assert say == {
        "1.204": "1.204: people are counted whole; a thousands mark is a comma, as in 1,204",
        "1.204.567": "1.204.567: people are counted whole; a thousands mark is a comma, as in 1,204,567",
        "1.20": "1.20: people are counted whole, without decimals",
        "38, 374": "38, 374: one count in each cell",
        "38\t374": "38 374: one count in each cell",
    }
    assert gaps.gap_text(Gap("unreadable")) == "A cell of the table cannot be used; the line under the table says why."


def test_a_count_in_two_parts_says_how_it_is_read():
    """Two counts in one cell are never taken for one in silence."""
    mark = Mark(field="", key="read-as", facts={"text": "38 374", "value": 38374})
    assert gaps.mark_text(mark) == "38 374: read as 38,374; two counts need two cells"


def test_a_long_text_is_quoted_short_and_on_one_line():
    """Forty characters of what was typed, whatever it holds."""
    text = gaps.mark_text(Mark(field="", key="not-a-count", facts={"text": "{a}\n" * 30}))
    assert len(text.split(": ")[0]) <= LONGEST_QUOTE
    assert "\n" not in text


@pytest.mark.parametrize("key", [rule.key for rule in CAUTIONS])
def test_every_caution_has_a_title_and_a_sentence_with_its_numbers(key):
    """No caution of the table is without words, and no fact stays in braces."""
    caution = Caution(key=key, facts=FACTS)
    text = cautions.caution_text(caution)
    assert cautions.caution_title(caution) != cautions.UNKNOWN[0]
    assert text.endswith(".")
    assert not re.search(r"[{}…]", text)


@pytest.mark.parametrize("key", [rule.key for rule in CAUTIONS])
@pytest.mark.parametrize("more", [{}, {"beside": "adjusted"}, {"strata": 3}, {"carried": 1}])
def test_no_caution_recommends(key, more):
    """It says what a figure rests on, and leaves what to take to the reader."""
    text = cautions.caution_text(Caution(key=key, facts={**FACTS, **more}))
    assert not re.search(r"\b(is better|best|prefer\w*|should|recommend\w*|ought)\b", text)


@pytest.mark.parametrize("key", [*cautions.TEXTS, "a key of a later version"])
def test_a_caution_without_its_facts_is_still_a_sentence(key):
    """A hole in the facts never raises."""
    assert cautions.caution_text(Caution(key=key)).endswith(".")


def test_a_caution_says_the_numbers_it_is_about():
    """The risk ratio kept constant names both risks."""
    other = {**FACTS, "other": 0.0356, "becomes": 0.0647}
    text = cautions.caution_text(Caution(key="effect-kept-constant", facts=other))
    assert text == (
        "The risk ratio is assumed to be the same at 12% as at the study’s own 17.1%; with the risk ratio of not "
        "having the event kept instead, 12% would become 3.6%, not 6.5%."
    )
    by_odds = cautions.caution_text(Caution(key="effect-kept-constant", facts={**FACTS, "effect": "odds_ratio"}))
    assert by_odds == "The odds ratio is assumed to be the same at 12% as at the study’s own 17.1%."


def test_a_case_control_study_rests_on_two_assumptions():
    """The starting risk from elsewhere, and the odds ratio's being the same there."""
    facts: dict[str, str | float] = {"baseline": 0.12, "effect": "odds_ratio"}
    assert cautions.caution_text(Caution(key="rests-on-baseline", facts=facts)) == (
        "Every risk, difference and number needed here rests on the starting risk of 12%, which is not from this "
        "study, and on the odds ratio being the same there."
    )


def test_what_was_added_is_said_as_it_was():
    """Walter adds to events and people, Gart to all four counts, and neither alters the estimate."""
    ratio, odds_ratio = (
        cautions.caution_text(Caution(key="half-added", facts={"measure": measure}))
        for measure in ("risk_ratio", "odds_ratio")
    )
    assert ratio == (
        "Because of a count of 0, the textbook interval of the risk ratio is that with half added to the events and to "
        f"the people of each group (Walter). {cautions.PLAIN_ESTIMATE}"
    )
    assert odds_ratio == (
        "Because of a count of 0, the textbook interval of the odds ratio is that with half added to each of the four "
        f"counts (Gart). {cautions.PLAIN_ESTIMATE}"
    )


@pytest.mark.parametrize("key", ["effect-kept-constant", "odds-ratio-differs", "half-added"])
def test_in_a_survey_the_ratio_is_one_of_prevalences(key):
    """The cautions call it as the rows do."""
    facts = {**FACTS, "design": "survey", "measure": "risk_ratio"}
    text = cautions.caution_text(Caution(key=key, facts=facts))
    assert "prevalence ratio" in text
    assert "risk ratio" not in text
    assert "risk ratio" in cautions.caution_text(Caution(key=key, facts={**facts, "design": "cohort"}))


def test_several_zeros_are_counted():
    """One is, two are."""
    one, two = (cautions.caution_text(Caution(key="zero-cells", facts={"count": n})) for n in (1, 2))
    assert one.startswith("One of the four counts is 0")
    assert two.startswith("Two of the four counts are 0")


@pytest.mark.parametrize("block", [cautions.STANDING, " ".join(cautions.STANDING_FULL)])
@pytest.mark.parametrize(
    "part",
    [
        "alculates and displays what a study’s numbers imply",
        "oes not recommend",
        "does not replace clinical judgement, local guidelines or qualified advice",
        "what was typed",
        "against the paper",
        "verages of a study’s people",
        "ne study is not all the evidence",
        "ot assessed as a medical device",
    ],
)
def test_the_standing_block_leaves_nothing_out(block, part):
    """On screen and in exports the same things are said."""
    assert part in block


def test_a_mark_of_an_empty_field_begins_with_what_is_wrong():
    """Nothing was typed there that could be named."""
    facts = {"text": "", "unit": "person-years"}
    assert gaps.mark_text(Mark(field="second_right_text", key="units-differ", facts=facts)) == (
        "The other group’s person-time is in person-years; rates need one unit"
    )
