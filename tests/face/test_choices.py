"""Study, form, layout, groups, family and level: choices change what is shown and never what was typed."""

from __future__ import annotations

from collections.abc import Callable
from typing import TYPE_CHECKING

import pytest

from fourcount.face import dialogs
from fourcount.record.outcome import CELLS, EventsAndOthers, EventsOfTotal
from fourcount.wording import labels

if TYPE_CHECKING:
    from conftest import Hands


def everything_typed(hands: Hands) -> list[str]:
    """The text of every field of the window that is part of the record."""
    window, grid = hands.window, hands.window.printed.grid
    fields = [
        window.header.title, window.header.source, window.printed.name, window.printed.span, *grid.cells.values(),
        *grid.labels.values(), *grid.headings.values(), window.patient.baseline, window.patient.source,
    ]  # fmt: skip
    return [field.text() for field in fields]


@pytest.fixture
def named(example: Hands) -> Hands:
    """Hands at a window with every field filled."""
    window, grid = example.window, example.window.printed.grid
    for field, text in {
        window.header.title: "A trial", window.header.source: "table 2", window.printed.span: "12 months",
        window.printed.event_words: "fell at least once", grid.labels["first"]: "Night lights",
        grid.labels["second"]: "Usual care", grid.headings["left"]: "fell", grid.headings["right"]: "did not fall",
        window.patient.baseline: "12%", window.patient.source: "own ward",
    }.items():  # fmt: skip
        example.write(field, text)
    return example


def test_every_design_keeps_everything_that_was_typed(named: Hands) -> None:
    """Through all four designs and back to the first, no text moves and the figures return."""
    typed, rows = everything_typed(named), named.rows
    for design in ("cohort study", "cross-sectional survey", "case-control study", "randomised trial"):
        named.choose(named.window.printed.design, design)
        assert everything_typed(named) == typed
    assert named.rows == rows


def test_a_case_control_study_withholds_risks_with_one_reason(example: Hands) -> None:
    """Only the odds ratio stands; difference, number needed, risks and their ratio are one line with one reason."""
    example.choose(example.window.printed.design, "case-control study")
    reason = "A case-control study sets how many cases and controls it takes"
    assert next(iter(example.rows)) == "odds_ratio"
    withheld = [row for key, row in example.rows.items() if key != "odds_ratio"]
    assert len(withheld) == 1
    assert reason in withheld[0]
    assert all(name in withheld[0] for name in ("Difference", "NNT", "Risk, reference group", "Risk ratio"))
    assert not any(character.isdigit() for character in withheld[0])
    assert "odds" in example.sentence.lower()
    assert not example.window.patient.figures.picture.isVisible()
    assert "starting risk" in example.window.patient.waits.text()


def test_a_case_control_study_with_a_starting_risk_says_what_it_rests_on(example: Hands) -> None:
    """With an outside risk the patient's column draws, carries the odds ratio, and a caution names the risk."""
    example.choose(example.window.printed.design, "case-control study")
    example.write(example.window.patient.baseline, "12%")
    assert example.window.patient.figures.picture.isVisible()
    assert not example.window.patient.effect.isEnabled()
    assert example.window.patient.effect.currentText().startswith("odds ratio")
    assert any("rests on the starting risk of 12%" in text for text in example.window.cautions.texts)
    example.choose(example.window.printed.design, "randomised trial")
    assert example.window.patient.effect.isEnabled()
    assert example.window.patient.effect.currentText().startswith("risk ratio")


def test_a_case_control_grid_is_headed_by_cases_and_controls(hands: Hands) -> None:
    """Where columns are cases and controls, an empty heading says so."""
    hands.choose(hands.window.printed.design, "case-control study")
    headings = hands.window.printed.grid.headings
    assert (headings["left"].placeholderText(), headings["right"].placeholderText()) == ("cases", "controls")


def test_a_survey_gives_prevalences_and_no_number_needed(example: Hands) -> None:
    """Cross-sectional figures are called prevalences, and the number needed is withheld with its reason."""
    example.choose(example.window.printed.design, "cross-sectional survey")
    assert example.rows["risk_reference"].startswith("Prevalence, reference group: 17.1%")
    assert example.rows["risk_ratio"].startswith("Prevalence ratio: 0.54")
    assert "gives no number needed to treat" in example.rows["number_needed"]
    assert not any(character.isdigit() for character in example.rows["number_needed"])


def test_a_cohort_brings_its_caution(example: Hands) -> None:
    """Crude figures of an observational study say that they are."""
    before = example.window.cautions.texts
    example.choose(example.window.printed.design, "cohort study")
    assert any("crude figures" in text for text in example.window.cautions.texts)
    example.choose(example.window.printed.design, "randomised trial")
    assert example.window.cautions.texts == before


@pytest.mark.parametrize("how", ["key", "link"])
def test_swapping_groups_moves_no_text(named: Hands, how: str) -> None:
    """The other group becomes the index group: figures turn, the table stays where the paper has it."""
    typed, grid = everything_typed(named), named.window.printed.grid
    if how == "key":
        named.do("swap")
    else:
        named.click(named.window.printed.links[0])
    assert everything_typed(named) == typed
    assert (grid.roles["first"].text(), grid.roles["second"].text()) == ("reference", "index")
    assert named.rows["risk_difference"].startswith("Difference: 7.9 more")
    assert named.rows["number_needed"].startswith("NNTH")
    assert named.rows["risk_ratio"].startswith("Risk ratio: 1.86")
    named.do("swap")
    assert named.rows["risk_ratio"].startswith("Risk ratio: 0.54")


@pytest.mark.parametrize("how", ["key", "link"])
def test_counting_the_other_outcome_turns_the_starting_risk_and_moves_no_other_text(named: Hands, how: str) -> None:
    """The other column is counted: risks are those of it, and it is welcome where the first was not."""
    typed, grid = everything_typed(named), named.window.printed.grid
    assert named.window.printed.welcome.currentText() == "unwelcome"
    if how == "key":
        named.do("count-other")
    else:
        named.click(named.window.printed.links[1])
    assert everything_typed(named) == ["88%" if text == "12%" else text for text in typed]
    assert (grid.roles["left"].text(), grid.roles["right"].text()) == ("", "counted")
    assert named.window.printed.welcome.currentText() == "welcome"
    assert named.rows["risk_reference"].startswith("Risk, usual care: 82.9%")
    assert named.rows["number_needed"].startswith("NNTB")
    assert named.window.printed.event_words.text() == ""
    named.do("count-other")
    assert named.window.printed.event_words.text() == "fell at least once"
    assert everything_typed(named) == typed


def test_each_column_has_event_words_of_its_own(named: Hands) -> None:
    """Words typed while the other outcome is counted belong to it."""
    named.do("count-other")
    named.write(named.window.printed.event_words, "stayed on their feet")
    assert "stayed on their feet" in named.sentence
    named.do("count-other")
    assert named.window.printed.event_words.text() == "fell at least once"
    assert "fell at least once" in named.sentence


def test_a_welcome_event_turns_benefit_and_harm(example: Hands) -> None:
    """Fewer of a good thing is harm; the ratio stays the event's."""
    example.choose(example.window.printed.welcome, "welcome")
    assert example.rows["number_needed"].startswith("NNTH")
    assert example.rows["risk_ratio"].startswith("Risk ratio: 0.54")
    example.choose(example.window.printed.welcome, "unwelcome")
    assert example.rows["number_needed"].startswith("NNTB")


@pytest.mark.parametrize("how", ["key", "choice"])
def test_the_form_of_print_converts_the_counts(example: Hands, how: str) -> None:
    """38 · 374 becomes 38 of 412 with the same figures, and comes back."""
    rows, form = example.rows, example.window.printed.form
    if how == "key":
        example.do("form-events-of-total")
    else:
        example.choose(form, "38 of 412")
    assert form.currentText() == "38 of 412"
    assert isinstance(example.window.session.outcome.table, EventsOfTotal)
    assert example.texts == ("38", "412", "70", "409")
    assert example.rows == rows
    if how == "key":
        example.do("form-events-and-others")
    else:
        example.choose(form, "38 · 374")
    assert example.texts == ("38", "374", "70", "339")
    assert isinstance(example.window.session.outcome.table, EventsAndOthers)
    assert example.rows == rows


def test_counts_of_totals_are_typed_as_printed(hands: Hands) -> None:
    """In the form 38 of 412 the second column takes everybody, and the others are worked out beside it."""
    hands.do("form-events-of-total")
    hands.count("38", "412", "70", "409")
    totals = hands.window.printed.grid.totals
    assert hands.rows["risk_ratio"].startswith("Risk ratio: 0.54")
    assert (totals["first"].text(), totals["second"].text()) == ("374", "339")
    assert hands.window.printed.grid.cells[CELLS[1]].accessibleName() == "first group, all people"


def test_more_events_than_people_are_marked_in_that_form(hands: Hands) -> None:
    """500 of 412 cannot be."""
    hands.do("form-events-of-total")
    hands.count("500", "412", "70", "409")
    assert hands.notes == ["500: more events than people; the events have to fit into the total"]


def test_an_unreadable_row_keeps_its_text_in_another_form(hands: Hands) -> None:
    """What could not be converted is left as it was typed."""
    hands.count("38", "374", "abc", "339")
    hands.do("form-events-of-total")
    assert hands.texts == ("38", "412", "abc", "339")


@pytest.mark.parametrize("how", ["key", "choice"])
def test_groups_run_down_or_across(example: Hands, how: str) -> None:
    """Transposed, the first group's cells stand in one column; texts and figures are the same."""
    rows, cells = example.rows, example.window.printed.grid.cells
    first, second = cells["first_left_text"], cells["first_right_text"]
    assert first.y() == second.y()
    if how == "key":
        example.do("layout")
    else:
        example.choose(example.window.printed.layout_choice, "groups across")
    example.qtbot.waitUntil(lambda: first.x() == second.x())
    assert first.y() < second.y()
    assert example.texts == ("38", "374", "70", "339")
    assert example.rows == rows
    example.do("layout")
    example.qtbot.waitUntil(lambda: first.y() == second.y())


@pytest.mark.parametrize(
    ("family", "risk", "difference"),
    [
        ("textbook", "Risk, reference group: 17.1%, 13.5 to 20.8%", "Difference: 7.9 fewer, 3.3 to 12.5"),
        ("exact", "Risk, reference group: 17.1%, 13.6 to 21.1%", "Difference: 7.9 fewer, 3.3 to 12.6"),
    ],
)
def test_a_family_changes_the_intervals(example: Hands, family: str, risk: str, difference: str) -> None:
    """Wald and Clopper-Pearson limits stand where Wilson's were; the estimates stay."""
    before = example.rows
    example.choose(example.window.says.family, family)
    example.qtbot.waitUntil(lambda: "follows" not in str(example.rows))
    assert example.rows["risk_reference"] == risk
    assert example.rows["risk_difference"] == difference
    assert family in example.row("risk_reference").accessibleDescription()
    example.choose(example.window.says.family, "score")
    assert example.rows == before


def test_a_level_changes_the_intervals(example: Hands) -> None:
    """A higher level widens every interval and keeps the estimates."""
    before = example.rows
    example.choose(example.window.says.level, "99%")
    after = example.rows
    assert all(after[key] != before[key] for key in before)
    assert all(after[key].split(",")[0] == before[key].split(",")[0] for key in ("risk_difference", "risk_ratio"))
    assert example.window.session.record.choices.level == 0.99


@pytest.fixture
def asked(monkeypatch: pytest.MonkeyPatch) -> Callable[..., list[tuple[str, str]]]:
    """Answer the question for a level with prepared answers; what was shown is written down."""

    def prepare(*answers: str | None) -> list[tuple[str, str]]:
        shown: list[tuple[str, str]] = []
        waiting = list(answers)

        def answer(parent: object, now: str, problem: str = "") -> str | None:
            shown.append((now, problem))
            return waiting.pop(0)

        monkeypatch.setattr(dialogs, "ask_level", answer)
        return shown

    return prepare


def test_another_level_is_asked_for(example: Hands, asked: Callable[..., list[tuple[str, str]]]) -> None:
    """The question offers the level in use; the answer becomes an entry of its own."""
    shown = asked("97.5%")
    example.do("level")
    assert shown == [("95%", "")]
    assert example.window.session.record.choices.level == pytest.approx(0.975)
    assert example.window.says.level.currentText() == "97.5%"
    example.do("undo")
    assert example.window.says.level.currentText() == "95%"


def test_bad_levels_are_asked_about_again(example: Hands, asked: Callable[..., list[tuple[str, str]]]) -> None:
    """Each bad answer comes back with a sentence about it, until one can be read."""
    shown = asked("abc", "50", "100", "", "-95", "0.9")
    example.do("level")
    problems = [problem for _, problem in shown]
    assert problems[0] == ""
    assert problems[1] == "abc: a confidence level is needed, such as 95%"
    assert problems[2] == "50: a confidence level here lies between 80% and 99.9%"
    assert problems[3].startswith("100: ")
    assert problems[5].startswith("-95: ")
    assert [now for now, _ in shown][:3] == ["95%", "abc", "50"]
    assert example.window.session.record.choices.level == pytest.approx(0.9)
    assert example.window.says.level.currentText() == "90%"


def test_a_question_that_is_put_away_changes_nothing(
    example: Hands, asked: Callable[..., list[tuple[str, str]]]
) -> None:
    """Without an answer the level stays, and the choice shows it again."""
    asked("abc", None)
    record = example.window.session.record
    example.do("level")
    assert example.window.session.record is record
    assert example.window.says.level.currentText() == "95%"


def test_more_measures_on_demand(example: Hands) -> None:
    """Odds stand under the fold; the link and the key show and hide them."""
    assert "odds_index" not in example.rows
    example.click(example.window.says.more)
    assert example.rows["odds_reference"].startswith("Odds, reference group: ")
    assert example.window.says.more.text() == labels.LINKS["less"]
    example.do("more")
    assert "odds_index" not in example.rows
    assert example.window.says.more.text() == labels.LINKS["more"]
