"""Tables for a spreadsheet: unrounded numbers, blanks with their reasons, and text that stays text."""

from __future__ import annotations

import re
from datetime import date
from fractions import Fraction
from html import unescape

import pytest

from copies import NUMBER, OUTCOME, RECORD, outcome_of, record_of, table_of
from fourcount.appraisal.appraise import appraise
from fourcount.publish.sheet import html, rows
from fourcount.record.paper import Choices
from fourcount.wording.cautions import caution_text
from fourcount.wording.exports import SHEET_HEAD


def test_a_limit_beyond_everybody_is_told_from_an_estimate_beyond_everybody() -> None:
    """A blank upper limit beside a risk that stands says that it is the limit that would pass 100%."""
    outcome = outcome_of((70, 339, 38, 374), risk="45%")
    found = {row[0].removeprefix("For one patient, "): row for row in table_of(outcome)}
    _, estimate, _, high, _, reason = found["45%: risk with"]
    assert NUMBER.fullmatch(estimate)
    assert high == ""
    assert "The upper limit of the risk would pass 100%" in reason
    above = {
        row[0].removeprefix("For one patient, "): row for row in table_of(outcome_of((70, 339, 38, 374), risk="70%"))
    }
    assert above["70%: risk with"][1] == ""
    assert "The risk would pass 100% here" in above["70%: risk with"][5]


def test_a_sheet_holds_unrounded_numbers() -> None:
    """The sheet's figures are the findings', to the last digit."""
    found = {row[0]: row for row in table_of(OUTCOME)}
    assert table_of(OUTCOME)[0] == SHEET_HEAD
    assert float(found["Difference"][1]) == float(Fraction(38, 412) - Fraction(70, 409))
    assert found["Odds ratio"][4] == "Miettinen–Nurminen score"
    assert float(found["p, two-sided"][1]) == pytest.approx(0.000829, abs=5e-7)


def test_a_sheet_says_what_it_is_about_and_who_made_it() -> None:
    """Name, title and source under the head where they were typed; version, date and intervals at the end."""
    findings = appraise(OUTCOME, RECORD.choices)
    first, *table = rows(RECORD, OUTCOME, findings, version="9.9", today=date(2030, 5, 1))
    assert first == SHEET_HEAD
    assert [row[0] for row in table[:3]] == [OUTCOME.name_text, RECORD.title_text, RECORD.source_text]
    assert table[-1][0] == "note"
    assert table[-1][5] == "Calculated with Fourcount 9.9 on 2030-05-01; score intervals at 95%."
    assert table_of(outcome_of((1, 2, 3, 4)))[1][0] == "A paper"


def test_a_sheet_names_its_counts_and_both_risks_of_a_patient() -> None:
    """People of each group with the event, and all; the risk without beside the risk with."""
    found = {row[0]: row for row in table_of(outcome_of((38, 374, 70, 339), risk="12%"))}
    assert found["People in the reference group who had the event"][1] == "70"
    assert found["People in the index group, all"][1] == "412"
    assert found["For one patient, 12%: risk without"][1:4] == ("0.12", "", "")
    assert "People with night lights who fell at least once" in {row[0] for row in table_of(OUTCOME)}


def test_a_limit_of_another_kind_names_it() -> None:
    """Where the number needed runs through infinity, the limit on the other side says its kind."""
    found = {row[0]: row for row in table_of(outcome_of((5, 5, 6, 4)))}
    row = found["NNTB in the study"]
    assert NUMBER.fullmatch(row[2])
    assert row[3].startswith("NNTH ")
    assert row[5]


def test_a_table_of_html_escapes_what_was_typed() -> None:
    """Markup in a label is text, and the table has the sheet's cells and nothing else."""
    outcome = outcome_of((38, 374, 70, 339), label='<b onclick="x">&')
    findings = appraise(outcome, Choices())
    table = html(record_of(outcome), outcome, findings, version="9.9", today=date(2030, 5, 1))
    assert set(re.findall("<[^>]*>", table)) == {
        f"<{end}{tag}>" for end in ("", "/") for tag in ("table", "tr", "th", "td")
    }
    cells = [unescape(cell) for cell in re.findall("<t[hd]>(.*?)</t[hd]>", table)]
    assert cells == [cell for row in table_of(outcome) for cell in row]


def test_a_sheet_leaves_blank_what_is_withheld_and_repeats_no_row() -> None:
    """One limit of the number needed; the odds ratio at the study's own risk, where it is the risk ratio."""
    found = {row[0]: row for row in table_of(outcome_of((80, 20, 40, 60), risk="45%"))}
    needed = found["For one patient, 45%: NNTH"]
    assert (needed[2], bool(NUMBER.fullmatch(needed[3])), "would pass 100%" in needed[5]) == ("", True, True)
    assert not any("as a risk ratio" in row[0] for row in table_of(outcome_of((80, 20, 40, 60))))


def test_a_reason_stands_once_in_its_row() -> None:
    """An interval that is withheld leaves two blanks and one reason."""
    found = {row[0]: row for row in table_of(outcome_of((0, 50, 0, 50)), Choices(family="textbook"))}
    _, estimate, low, high, method, reason = found["Risk, reference group"]
    assert (estimate, low, high) == ("0.0", "", "")
    assert (method, reason) == ("Wald", "An interval of zero width is withheld; the score family gives a real one.")


def test_cautions_stand_in_a_column_of_their_own() -> None:
    """Nobody reads a sentence for a measure."""
    outcome = outcome_of((38, 374, 70, 339), design="cohort")
    told = {row[5] for row in table_of(outcome) if row[0] == "caution"}
    assert told == {caution_text(caution) for caution in appraise(outcome, Choices()).cautions}
    assert all(row[:5] == ("caution", "", "", "", "") for row in table_of(outcome) if row[5] in told)


@pytest.mark.parametrize(
    ("counts", "cell"), [((38, 374, 70, 339), "0.000829"), ((900, 100, 100, 900), None), ((7, 3, 3, 7), "0.08124")]
)
def test_a_p_has_four_significant_digits(counts: tuple[int, ...], cell: str | None) -> None:
    """Written out, also where it is tiny: more digits mean nothing."""
    found = {row[0]: row for row in table_of(outcome_of(counts))}["p, two-sided"]
    assert cell is None or found[1] == cell
    assert "e" not in found[1]
    assert 1 <= len(found[1].replace(".", "").lstrip("0")) <= 4
    assert found[4] == "N−1 chi-square"


@pytest.mark.parametrize("lead", ["\ufeff", "\u200b", " \u200b", "\u2060\ufeff"])
def test_a_formula_behind_unseen_signs_is_text(lead: str) -> None:
    """A program that leaves them out must not find a formula."""
    for row in table_of(outcome_of((38, 374, 70, 339), label=f"{lead}=1+1")):
        assert not row[0].lstrip("\ufeff\u200b\u2060 ").startswith("=")
