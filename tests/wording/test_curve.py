"""The words of the curve: axes in the reader's own words, lines named at their ends, the numbers as a table."""

from __future__ import annotations

import re
from collections.abc import Callable

import msgspec
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from drawn_forms import outcomes
from forms import effect_only, strata
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.curve import curve, highest_start
from fourcount.appraisal.findings import OutcomeFindings
from fourcount.appraisal.findings.curve import Curve
from fourcount.picture.curve_axes import even_marks, reach_for
from fourcount.record.outcome import Outcome, Patient
from fourcount.record.paper import Choices, Record
from fourcount.wording.curve import (
    BAR,
    NO_EFFECT,
    NOTHING,
    OTHER_SPAN,
    CurveWords,
    View,
    curve_words,
    views,
)
from fourcount.wording.curve_table import CurveRow, curve_head, curve_rows

BANNED = re.compile(
    r"\b(significan\w*|(un)?likely|chances?|rare(ly)?|common|high risk|nan|None|inf|should|recommend\w*)\b|[{}]"
)


def drawn_of(findings: OutcomeFindings, *, whole: bool = False) -> Curve:
    """The curve as its window asks for it."""
    return curve(findings, 1.0 if whole else reach_for(highest_start(findings)))


def said(outcome: Outcome, view: View | None = None, *, whole: bool = False) -> CurveWords:
    """The words of an outcome's curve, in the view that comes first unless told otherwise."""
    findings = appraise(outcome, Choices())
    drawn = drawn_of(findings, whole=whole)
    shown = view or views(outcome, drawn)[0][0]
    return curve_words(Record(outcomes=(outcome,)), outcome, findings, drawn, shown)


def table(outcome: Outcome, view: View | None = None, *, whole: bool = False) -> dict[str, tuple[str, ...]]:
    drawn = drawn_of(appraise(outcome, Choices()), whole=whole)
    rows = curve_rows(drawn, view or views(outcome, drawn)[0][0], even_marks(drawn.reach))
    return {row.start: row.cells for row in rows}


@pytest.fixture
def at_12(outcome_of: Callable[..., Outcome]) -> Outcome:
    """The worked example for a patient who starts at 12%."""
    return outcome_of(patient=Patient(starting_risk_text="12%"), name_text="Falls", span_text="12 months")


def test_axes_say_whose_risk_it_is(at_12: Outcome) -> None:
    """Both axes name their group and the time span."""
    words = said(at_12)
    assert words.across == "Starting risk, with usual care, over 12 months"
    assert words.up == "Risk with night lights, over 12 months"
    assert words.reference == NO_EFFECT
    assert words.title == "Across starting risks: fell at least once"


def test_lines_are_named_with_their_values(at_12: Outcome) -> None:
    """The line of the band has its interval at its end, and a line that ends early says where."""
    assert said(at_12).names == (
        "risk ratio 0.54 (95% interval 0.37 to 0.78)",
        "odds ratio 0.49",
        "risk difference 7.9 fewer per 100; at starting risks under 7.9% the risk would fall below 0%",
    )


def test_a_line_that_passes_everybody_says_from_where(outcome_of: Callable[..., Outcome]) -> None:
    """A risk ratio of 2.73 takes the risk past 100% from 36.7% on."""
    words = said(outcome_of((60, 140, 22, 178), patient=Patient(starting_risk_text="30%")))
    assert words.names[0].endswith("; at starting risks over 36.7% the risk would pass 100%")
    assert "Where one limit would pass 100%" in " ".join(words.notes)


def test_the_sentence_says_what_each_effect_comes_to(at_12: Outcome) -> None:
    """At the study's own risk all agree; at the patient's each has its own figure."""
    assert said(at_12).sentence == (
        "At a starting risk of 17.1%, the study’s own: 9.2%, whichever effect is kept constant. At a starting risk of "
        "12%: 6.5% with the risk ratio kept constant, 6.3% with the odds ratio, 4.1% with the risk difference."
    )


def test_what_ends_early_is_the_risk_not_the_difference(at_12: Outcome) -> None:
    """No line's name can be read as if the difference itself lay below 0%; a survey says so of prevalences."""
    survey = msgspec.structs.replace(at_12, design="survey")
    assert said(at_12).names[2].endswith("the risk would fall below 0%")
    assert "starting prevalences under 7.9% the prevalence would fall below 0%" in said(survey).names[2]


def test_a_patient_without_a_point_is_told_why(outcome_of: Callable[..., Outcome]) -> None:
    """In the view whose effect leads past 100%, and only there; a starting risk that is missing has its own reason."""
    outcome = outcome_of((60, 40, 30, 70), patient=Patient(starting_risk_text="60%"))
    why = "The patient at 60% has no point here: with the risk ratio the risk would pass 100%."
    assert why in said(outcome, View(place=0)).notes
    for view in (View(place=1), View(place=2), View(ratios=True)):
        assert not [note for note in said(outcome, view).notes if "no point" in note]
    bare = said(outcome_of(design="case-control"))
    assert [note for note in bare.notes if note.startswith("No patient has a point here. ")]


def test_each_view_says_its_own_assumption_once(at_12: Outcome) -> None:
    """Risks keep each line's effect, the risk ratio of an odds ratio keeps the odds ratio."""
    risks, ratios = said(at_12), said(at_12, View(ratios=True))
    assert " ".join(risks.notes).count("assumption") == " ".join(ratios.notes).count("assumption") == 1
    assert ratios.notes[0].startswith("The odds ratio is kept the same at every starting risk.")


def test_the_description_has_every_text_in_full(at_12: Outcome) -> None:
    """Axes, names, sentence and notes, whatever length the drawing has room for."""
    long = msgspec.structs.replace(at_12, span_text="a span " * 285, first_label_text="a treatment " * 166)
    for view in (View(), View(ratios=True)):
        words = said(long, view)
        for text in (words.across, words.up, *words.names, words.sentence, *words.notes):
            assert text in words.described
    assert said(Outcome(), View()).described == NOTHING


def test_the_notes_say_what_is_assumed(at_12: Outcome) -> None:
    """That an effect is kept constant, and that the band takes each starting risk as certain."""
    notes = " ".join(said(at_12).notes)
    assert "That is an assumption" in notes
    assert "The band is the 95% interval of the risk ratio at each starting risk, which is taken as certain" in notes


def test_points_have_short_names_and_their_bar_is_explained(at_12: Outcome) -> None:
    """A point says whose it is and at which risk; the bar is only spoken of where it is drawn."""
    assert said(at_12).marks == ("study, 17.1%", "patient, 12%")
    assert BAR in said(at_12).notes
    assert BAR not in said(at_12, View(place=1)).notes


def test_three_starting_risks_are_three_points(at_12: Outcome) -> None:
    """Low, usual and high are named, and each is said in the sentence."""
    patient = Patient(start_kind="three", starting_risk_text="12%", low_risk_text="5%", high_risk_text="30%")
    words = said(msgspec.structs.replace(at_12, patient=patient))
    assert words.marks == ("study, 17.1%", "patient, low, 5%", "patient, usual, 12%", "patient, high, 30%")
    assert words.sentence.count("At a starting risk of") == 4


def test_another_time_span_is_not_drawn_but_said(at_12: Outcome) -> None:
    """The curve keeps the study's own span; the patient's point is the risk within it."""
    outcome = msgspec.structs.replace(at_12, patient=Patient(starting_risk_text="12%", other_span_text="5 years"))
    assert OTHER_SPAN in said(outcome).notes
    assert said(outcome).sentence == said(at_12).sentence
    assert BAR not in said(outcome).notes


def test_the_odds_ratio_is_said_as_a_risk_ratio(at_12: Outcome) -> None:
    """The second view gives the risk ratio at the points, and at the odds ratio's own line its name."""
    words = said(at_12, View(ratios=True))
    assert words.up == "Risk ratio with the odds ratio kept constant (logarithmic axis)"
    assert words.itself == "the odds ratio itself"
    assert words.sentence.endswith("At a starting risk of 12%: the odds ratio is a risk ratio of 0.52.")


def test_views_begin_with_the_effect_that_is_carried(at_12: Outcome) -> None:
    """What the patient is told comes first; odds ratios as risk ratios come last."""
    outcome = msgspec.structs.replace(at_12, patient=Patient(starting_risk_text="12%", effect="odds_ratio"))
    drawn = drawn_of(appraise(outcome, Choices()))
    assert [text for _, text in views(outcome, drawn)] == [
        "Risk with: odds ratio and its interval",
        "Risk with: risk ratio and its interval",
        "Risk with: risk difference and its interval",
        "Odds ratio as a risk ratio",
    ]


def test_the_table_holds_the_points_among_round_risks(at_12: Outcome) -> None:
    """A row for each round starting risk, the study's and the patient's; what cannot be says so."""
    rows = table(at_12)
    assert list(rows) == ["0%", "10%", "12% (this patient)", "17.1% (the study)", "20%", "30%", "40%"]
    assert rows["12% (this patient)"][0] == "6.5% (4.5 to 9.3%)"
    assert rows["0%"] == ("0%", "0%", "below 0%")  # nobody stays nobody: there is no interval


def test_the_table_of_ratios_has_one_column(at_12: Outcome) -> None:
    """The odds ratio as a risk ratio, with both limits."""
    drawn = drawn_of(appraise(at_12, Choices()))
    assert curve_head(at_12, drawn, View(ratios=True)) == CurveRow(
        "Starting risk", ("Odds ratio 0.49 as a risk ratio",)
    )
    assert table(at_12, View(ratios=True))["12% (this patient)"] == ("0.52 (0.35 to 0.77)",)


def test_an_effect_alone_has_its_own_line() -> None:
    """A printed hazard ratio is drawn by itself and keeps the digits of its print."""
    outcome = effect_only("hazard_ratio", "0.7 (0.6 to 0.9)", patient=Patient(starting_risk_text="20%"))
    assert said(outcome).names == ("hazard ratio 0.7 (95% interval 0.6 to 0.9)",)


def test_pooled_effects_are_named_so() -> None:
    """Strata carry their pooled effects."""
    assert all(name.startswith("pooled ") for name in said(strata(risk="12%")).names)


def test_a_survey_has_prevalences(outcome_of: Callable[..., Outcome]) -> None:
    """No word of a risk stands where a survey found prevalences."""
    outcome = outcome_of(design="survey", patient=Patient(starting_risk_text="12%"))
    words = said(outcome)
    texts = (words.title, words.across, words.up, *words.names, words.sentence, *words.notes)
    assert not [text for text in texts if re.search(r"\brisks?\b", text)]


def test_without_any_point_the_middle_is_told() -> None:
    """An effect alone, without a starting risk, is said at 50%."""
    words = said(effect_only("risk_ratio", "0.72 (0.55 to 0.92)"))
    assert words.sentence == "At a starting risk of 50%: 36.0% with the risk ratio kept constant."


def test_nothing_to_carry_is_said() -> None:
    """An empty table says in one sentence that there is nothing to draw."""
    outcome = Outcome()
    findings = appraise(outcome, Choices())
    drawn = drawn_of(findings)
    assert views(outcome, drawn) == []
    assert curve_words(Record(), outcome, findings, drawn, View()).notes == (NOTHING,)
    assert curve_rows(drawn, View(), (0.0, 1.0)) == []


@settings(max_examples=60)
@given(outcomes(), st.booleans())
def test_every_text_exists_whatever_is_typed(outcome: Outcome, whole: bool) -> None:
    """No exception, no raw value, no verdict in any view."""
    findings = appraise(outcome, Choices())
    drawn = drawn_of(findings, whole=whole)
    plain = msgspec.structs.replace(outcome, first_label_text="", adjusted_for_text="")
    for view, name in views(plain, drawn):
        words = curve_words(Record(), plain, findings, drawn, view)
        rows = curve_rows(drawn, view, even_marks(drawn.reach))
        cells = [text for row in (curve_head(plain, drawn, view), *rows) for text in (row.start, *row.cells)]
        texts = (name, words.title, words.across, words.up, *words.names, *words.marks, words.sentence, *words.notes)
        assert not [text for text in (*texts, *cells) if BANNED.search(text)]
        assert all((*texts, *cells))
