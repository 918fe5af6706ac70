"""The sentence of the reader's own line, and its rows in the working."""

from __future__ import annotations

import itertools
from typing import Any

import msgspec
import pytest

from fourcount.appraisal.findings import Gap, OutcomeFindings, OwnLine
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording.own_line import line_sentence, mark_words, own_line_sentence, value_text
from fourcount.wording.working import working

VERDICTS = ("significan", "non-inferior", "noninferior", "superior", "proven", "equivalent", "fails", "success")


def a_line(**changes: Any) -> OwnLine:
    plain = OwnLine(kind="matters", measure="risk_difference", value=-0.02, lies="beyond", worse_side=False)
    return msgspec.structs.replace(plain, **changes)


def a_margin(**changes: Any) -> OwnLine:
    return a_line(kind="margin", value=0.02, worse_side=True, lies="short", p=0.0123, method="margin-score", **changes)


def test_a_margin_says_where_its_interval_and_its_p_disagree() -> None:
    """They rest on different methods, and one sentence would otherwise say two things."""
    outcome = Outcome(line_kind="margin")
    said = line_sentence(outcome, a_margin(parted=True))
    assert said.endswith("The interval rests on another method than the p, and here the two disagree.")
    assert said.startswith(line_sentence(outcome, a_margin()))


@pytest.mark.parametrize(
    ("lies", "said"),
    [
        (
            "beyond",
            (
                "The 95% interval of the difference lies wholly beyond your line of 2 fewer per 100: "
                "everything in it passes what you said would matter."
            ),
        ),
        (
            "short",
            (
                "The 95% interval of the difference lies wholly short of your line of 2 fewer per 100: "
                "nothing in it reaches what you said would matter."
            ),
        ),
        (
            "across",
            (
                "The 95% interval of the difference lies on both sides of your line of 2 fewer per 100: "
                "it holds effects that would matter and effects that would not."
            ),
        ),
    ],
)
def test_what_would_matter(lies: str, said: str) -> None:
    """One sentence on which side of the line the interval lies."""
    assert line_sentence(Outcome(), a_line(lies=lies)) == said


def test_a_margin_on_the_worse_side() -> None:
    """Short of it is the better side; the p is one-sided and says against what it speaks, and by whose method."""
    assert line_sentence(Outcome(), a_margin()) == (
        "The 95% interval of the difference lies wholly on the better side of your margin of 2 more per 100 "
        "(one-sided p = 0.012 against an effect at the margin or worse; Miettinen–Nurminen)."
    )


@pytest.mark.parametrize(
    ("worse_side", "lies", "side"),
    [
        (True, "short", "better side"),
        (True, "beyond", "worse side"),
        (False, "short", "worse side"),
        (False, "beyond", "better side"),
        (True, "across", "both sides"),
        (False, "across", "both sides"),
    ],
)
def test_better_and_worse_are_those_of_the_margin(worse_side: bool, lies: str, side: str) -> None:
    """Which side is better does not hang on which side of no effect the margin lies; that is said by itself."""
    line = msgspec.structs.replace(a_margin(), worse_side=worse_side, lies=lies)
    said = line_sentence(Outcome(), line)
    assert f"{side} of your margin" in said
    assert ("2 more per 100 (itself better than no effect)" in said) != worse_side
    assert "against an effect at the margin or worse" in said


def test_no_sentence_gives_a_verdict() -> None:
    """Where the interval lies is said, not what to call it."""
    for kind, lies, worse in itertools.product(("matters", "margin"), ("beyond", "short", "across"), (True, False)):
        line = msgspec.structs.replace(a_margin(), kind=kind, lies=lies, worse_side=worse)
        said = line_sentence(Outcome(), line).lower()
        assert not [word for word in VERDICTS if word in said]
        assert said.count(". ") == 0


@pytest.mark.parametrize(
    ("measure", "value", "said"),
    [
        ("risk_difference", -0.02, "2 fewer per 100"),
        ("pair_difference", 0.005, "0.5 more per 100"),
        ("pooled_risk_difference", 0.125, "12.5 more per 100"),
        ("risk_ratio", 1.25, "1.25"),
        ("odds_ratio", 0.8, "0.80"),
    ],
)
def test_the_value_is_said_on_its_scale(measure: str, value: float, said: str) -> None:
    """A difference per 100 with its side, a ratio as a ratio; the mark says whose it is."""
    line = a_line(measure=measure, value=value)
    assert value_text(line) == said
    assert mark_words(line) == f"The flag is your line, {said}."
    assert mark_words(msgspec.structs.replace(line, kind="margin")) == f"The flag is your margin, {said}."


def test_the_measure_and_the_level_are_named() -> None:
    """An odds ratio is one, a survey compares prevalences, and the level is that of the interval."""
    odds = a_line(measure="odds_ratio", value=0.8, level=0.9)
    assert line_sentence(Outcome(), odds).startswith("The 90% interval of the odds ratio lies")
    survey = line_sentence(Outcome(design="survey"), a_line(measure="risk_ratio", value=0.8))
    assert survey.startswith("The 95% interval of the prevalence ratio lies")


def test_a_p_that_cannot_be_given_has_its_reason() -> None:
    """Where the interval stands and the p does not, the sentence says why."""
    line = msgspec.structs.replace(a_margin(), p=Gap("endless-limit"))
    assert line_sentence(Outcome(), line).endswith(
        "2 more per 100. There is no p: a limit is infinite, so no standard error follows from it."
    )


def test_of_an_outcome_without_a_line_nothing_is_said(outcome_of: Any, findings_of: Any) -> None:
    """No line, no words; a line that cannot be drawn gives its reason."""
    outcome = outcome_of()
    findings: OutcomeFindings = findings_of(outcome)
    assert own_line_sentence(outcome, msgspec.structs.replace(findings, line=None)) == ""
    gone = msgspec.structs.replace(findings, line=Gap("line-scale-not-here"))
    assert own_line_sentence(outcome, gone).startswith("There is no such measure here")


def test_the_working_of_the_measure_shows_the_test(outcome_of: Any, findings_of: Any) -> None:
    """The margin, its p and the method's formula and source stand with the measure that it is drawn on, there alone."""
    outcome = outcome_of()
    findings = msgspec.structs.replace(findings_of(outcome), line=a_margin())
    rows = dict(working("risk_difference", outcome, findings, Choices()).rows)
    assert rows["Your margin"] == "2 more per 100"
    assert rows["p of the margin, one-sided"] == "0.012"
    assert rows["Method"] == "Miettinen–Nurminen one-sided p of a margin"
    assert "Your margin" not in dict(working("risk_ratio", outcome, findings, Choices()).rows)
