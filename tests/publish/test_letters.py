"""Findings as prose, as a listing for a terminal, and as a table for a spreadsheet."""

from __future__ import annotations

import re
from datetime import date
from fractions import Fraction
from html import unescape

import msgspec
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import Gap
from fourcount.publish.listing import WIDTH, listing
from fourcount.publish.plain_text import one_line
from fourcount.publish.prose import prose
from fourcount.publish.sheet import Row, html, rows, tsv
from fourcount.record.outcome import CELLS, DESIGNS, EventsAndOthers, Outcome, Patient
from fourcount.record.paper import FAMILIES, Choices, Record
from fourcount.wording.cautions import STANDING, STANDING_FULL, caution_text
from fourcount.wording.example import worked_example
from fourcount.wording.exports import SHEET_HEAD
from fourcount.wording.gaps import gap_text

RECORD = worked_example()
OUTCOME = RECORD.outcomes[0]
NUMBER = re.compile(r"-?\d+(\.\d+)?(e[-+]?\d+)?|infinity")
COUNTS = st.tuples(*[st.integers(0, 30)] * 4)
HOSTILE = [
    "=1+1",
    "+1",
    "-1",
    "@SUM(A1)",
    "\t=1",
    "\uff1d1",
    '"open',
    "'=1",
    "a\tb\nc\rd",
    "\u202eevil",
    "\x00\x1b[31m",
]


def outcome_of(counts: tuple[int, ...], *, design: str = "trial", risk: str = "", label: str = "") -> Outcome:
    """An outcome of four plain counts, the reader's words all the same text."""
    words = dict.fromkeys(("name_text", "first_label_text", "second_label_text", "left_words_text", "span_text"), label)
    table = EventsAndOthers(**dict(zip(CELLS, map(str, counts), strict=True)))
    return msgspec.convert(
        {**words, "design": design, "table": msgspec.to_builtins(table), "patient": {"starting_risk_text": risk}},
        Outcome,
    )


def record_of(outcome: Outcome, choices: Choices | None = None) -> Record:
    return Record(title_text="A paper", outcomes=(outcome,), choices=choices or Choices())


def letter(outcome: Outcome, choices: Choices | None = None) -> str:
    record = record_of(outcome, choices)
    return prose(record, outcome, appraise(outcome, record.choices), version="9.9", today=date(2030, 5, 1))


def table_of(outcome: Outcome, choices: Choices | None = None) -> tuple[Row, ...]:
    record = record_of(outcome, choices)
    return rows(record, outcome, appraise(outcome, record.choices), version="9.9", today=date(2030, 5, 1))


def sheet_of(outcome: Outcome) -> str:
    return tsv(record_of(outcome), outcome, appraise(outcome, Choices()), version="9.9", today=date(2030, 5, 1))


def on_screen(outcome: Outcome, choices: Choices | None = None) -> str:
    chosen = choices or Choices()
    return listing(outcome, appraise(outcome, chosen), chosen)


def test_a_letter_holds_names_counts_and_origin() -> None:
    """The reader's words, the four counts, version and date are all there."""
    findings = appraise(OUTCOME, RECORD.choices)
    text = prose(RECORD, OUTCOME, findings, version="9.9", today=date(2030, 5, 1))
    for part in ("Falls", RECORD.title_text, RECORD.source_text, "night lights", "38", "374", "70", "339", "12 months"):
        assert part in text
    assert text.rstrip().splitlines()[-1].count("9.9") == 1
    assert "2030-05-01" in text


def test_a_letter_says_the_absolute_first() -> None:
    """Risks and their difference come before any ratio."""
    text = letter(OUTCOME)
    assert text.index("17.1%") < text.index("0.54")
    assert text.index("NNTB") < text.index("0.54") < text.index("0.49")


@pytest.mark.parametrize("design", DESIGNS)
def test_every_export_carries_the_cautions(design: str) -> None:
    """Each caution that holds, and the standing block, is in the letter, the sheet and the listing."""
    outcome = outcome_of((3, 97, 0, 100), design=design, risk="12%")
    findings = appraise(outcome, Choices())
    texts = [letter(outcome), sheet_of(outcome), " ".join(on_screen(outcome).split())]
    assert findings.cautions
    for caution in findings.cautions:
        assert all(one_line(caution_text(caution)) in text for text in texts)
    assert all(sentence in text for sentence in STANDING_FULL for text in texts[:2])
    assert STANDING in texts[2]


def test_a_shared_reason_is_said_once() -> None:
    """What a case-control study withholds is explained once in a letter and once in a listing."""
    outcome = outcome_of((38, 374, 70, 339), design="case-control")
    findings = appraise(outcome, Choices())
    gap = findings.measures["risk_index"]
    assert isinstance(gap, Gap)
    assert gap == findings.measures["risk_ratio"]
    reason = gap_text(gap)
    assert letter(outcome).count(reason) == 1
    survey = letter(outcome_of((38, 374, 70, 339), design="survey", risk="12%"))
    assert survey.count("gives no number needed to treat") == 1
    assert " ".join(on_screen(outcome).split()).count(reason) == 1


LETTER = """\
Falls · Night lights on a rehabilitation ward · invented example · table 2

Usual care: 70 fell at least once, 339 did not fall. Night lights: 38 fell at least once, 374 did not fall.

Of 100 people with usual care about 17 fell at least once within 12 months; of 100 with night lights about 9. That is \
8 fewer, and could be as few as 3 or as many as 13 (95% interval).

- Risk with usual care: 17.1% (95% interval 13.8 to 21.1%), 70 of 409
- Risk with night lights: 9.2% (95% interval 6.8 to 12.4%), 38 of 412
- Difference: 7.9 fewer per 100 (95% interval 3.3 to 12.6)
- NNTB 13 (95% interval 8 to 31) over 12 months
- Risk ratio: 0.54 (95% interval 0.37 to 0.78), relative reduction 46%
- Odds ratio: 0.49 (95% interval 0.32 to 0.75), as a risk ratio at 12%: 0.52 (0.35 to 0.77)
- p < 0.001 by the (N−1) chi-square test of no association, two-sided. It does not say how large the effect is; the \
intervals do.

For one patient: starting risk 12% (ward audit 2025), risk ratio 0.54 (0.37 to 0.78) kept constant. Of 100 people with \
usual care 12 fell at least once within 12 months, of 100 with night lights 6: 6 fewer in 100 (95% interval 3 to 8). \
NNTB at this starting risk 19 (14 to 38).
"""


def test_a_letter_reads_as_a_whole() -> None:
    """Each thing is said once and in as few words as it takes: counts, headline, figures, the patient."""
    patient = Patient(starting_risk_text="12%", starting_risk_source_text="ward audit 2025")
    outcome = msgspec.structs.replace(OUTCOME, patient=patient)
    text = prose(RECORD, outcome, appraise(outcome, RECORD.choices), version="9.9", today=date(2030, 5, 1))
    start, rest = text.split("\nCautions:\n")
    assert start == LETTER
    assert rest.endswith("Calculated with Fourcount 9.9 on 2030-05-01; score intervals at 95%.\n")


def test_a_letter_of_a_welcome_event_speaks_of_the_event() -> None:
    """The patient's sentence counts what the headline counts."""
    outcome = msgspec.structs.replace(
        outcome_of((60, 40, 51, 49), risk="40%"), left_welcome=True, left_words_text="healed"
    )
    text = letter(outcome)
    assert "Of 100 people in the reference group 40 healed, of 100 in the index group 47: 7 more in 100 (95%" in text
    assert "NNTB at this starting risk" in text
    assert letter(OUTCOME).count("For one patient: at the study’s own starting risk. The study’s figures hold") == 1


@pytest.mark.parametrize("welcome", [True, False])
@pytest.mark.parametrize("named", ["left_words_text", "right_words_text", "span_text"])
@pytest.mark.parametrize(("counted", "without", "with_"), [("left", 51, 60), ("right", 49, 40)])
def test_every_copy_counts_the_same_people(welcome: bool, named: str, counted: str, without: int, with_: int) -> None:
    """Counts, headline and patient of the letter, and the sheet, stand beside the words of one and the same column."""
    plain = outcome_of((60, 40, 51, 49), risk=f"{without}%")
    outcome = msgspec.structs.replace(plain, counted=counted, left_welcome=welcome, **{named: "xyz"})
    words = {
        ("left", "left_words_text"): "xyz",
        ("right", "left_words_text"): "did not have the outcome “xyz”",
        ("left", "right_words_text"): "did not have the outcome “xyz”",
        ("right", "right_words_text"): "xyz",
        ("left", "span_text"): "had the event",
        ("right", "span_text"): "did not have the event",
    }[counted, named]
    text = letter(outcome)
    assert f"Reference group: {without} {words}, " in text
    assert f"Index group: {with_} {words}, " in text
    assert f"Of 100 people in the reference group about {without} {words}" in text
    assert f"Of 100 people in the reference group {without} {words}" in text
    assert f"of 100 in the index group {with_}: " in text
    assert (f"People in the index group who {words}", str(with_), "", "", "") in table_of(outcome)


def test_a_full_stop_in_a_name_breaks_no_sentence() -> None:
    """Typed at the end of a name, it stands nowhere inside a sentence of ours."""
    text = letter(outcome_of((38, 374, 70, 339), label="Name.", risk="12%"))
    assert not re.search(r"Name\. [a-z(0-9]|Name\.[,:;)]|Name\.\.", text, re.IGNORECASE)


def test_a_given_starting_risk_is_in_every_export() -> None:
    """The patient's figures follow wherever a starting risk was typed."""
    outcome = outcome_of((38, 374, 70, 339), risk="12%")
    assert "For one patient" in letter(outcome)
    assert "For one patient" in on_screen(outcome)
    assert sum(row[0].startswith("For one patient, 12%") for row in table_of(outcome) if row[1]) == 5
    assert any(row[0] == "For one patient, 12%: NNTB" for row in table_of(outcome))
    assert not any(row[0].startswith("For one patient") for row in table_of(OUTCOME))
    assert "For one patient" not in on_screen(OUTCOME)


def test_a_listing_says_both_risks_of_a_patient() -> None:
    """As percentages with their digits; where a risk is not given, so much is said in its place."""
    listed = on_screen(msgspec.structs.replace(OUTCOME, patient=Patient(starting_risk_text="12%"))).splitlines()
    assert "  Without: usual care, 12%" in listed
    assert "  With: night lights, 6%" in listed
    passing = on_screen(outcome_of((70, 339, 38, 374), risk="70%")).splitlines()
    assert "  Without: reference group, 70%" in passing
    assert "  With: index group, not given" in passing


def test_every_copy_says_what_the_patients_figures_rest_on() -> None:
    """The starting risk, its source and the effect carried to it are in the letter, the sheet and the listing."""
    patient = Patient(starting_risk_text="12%", starting_risk_source_text="ward audit 2025")
    outcome = msgspec.structs.replace(OUTCOME, patient=patient)
    rests = "tarting risk 12% (ward audit 2025), risk ratio 0.54 (0.37 to 0.78) kept constant."
    assert rests in letter(outcome)
    assert rests in " ".join(on_screen(outcome).split())
    assert sum(rests in row[0] for row in table_of(outcome)) == 1
    assert "at the study’s own starting risk." in letter(OUTCOME)


def test_long_names_leave_the_figures_in_their_columns() -> None:
    """A label of any length is wrapped above its figures, and no line is wider than a terminal."""
    text = on_screen(outcome_of((38, 374, 70, 339), label="a very long name " * 20))
    assert all(len(line) <= WIDTH for line in text.splitlines())
    assert "0.49  0.32 to 0.75" in text


def test_a_table_that_is_not_whole_says_so() -> None:
    """An empty table gives a sentence and the standing block, and no figure."""
    empty = Outcome(patient=Patient(starting_risk_text="x"))
    assert STANDING_FULL[0] in letter(empty)
    assert " ".join(on_screen(empty).split()).endswith(STANDING)
    assert all(row[1:4] == ("", "", "") for row in table_of(empty)[1:])


def test_a_limit_beyond_everybody_is_told_from_an_estimate_beyond_everybody() -> None:
    """A blank upper limit beside a risk that stands says that it is the limit that would pass 100%."""
    outcome = outcome_of((70, 339, 38, 374), risk="45%")
    found = {row[0].removeprefix("For one patient, "): row for row in table_of(outcome)}
    _, estimate, _, high, reason = found["45%: risk with"]
    assert NUMBER.fullmatch(estimate)
    assert high == ""
    assert "The upper limit of the risk would pass 100%" in reason
    above = {
        row[0].removeprefix("For one patient, "): row for row in table_of(outcome_of((70, 339, 38, 374), risk="70%"))
    }
    assert above["70%: risk with"][1] == ""
    assert "The risk would pass 100% here" in above["70%: risk with"][4]


def test_a_sheet_holds_unrounded_numbers() -> None:
    """The sheet's figures are the findings', to the last digit."""
    found = {row[0]: row for row in table_of(OUTCOME)}
    assert table_of(OUTCOME)[0] == SHEET_HEAD
    assert float(found["Difference"][1]) == float(Fraction(38, 412) - Fraction(70, 409))
    assert found["Odds ratio"][4] == "miettinen-nurminen"
    assert float(found["p, two-sided"][1]) == pytest.approx(0.000829, abs=5e-7)


def test_a_sheet_says_what_it_is_about_and_who_made_it() -> None:
    """Name, title and source under the head where they were typed; version, date and intervals at the end."""
    findings = appraise(OUTCOME, RECORD.choices)
    first, *table = rows(RECORD, OUTCOME, findings, version="9.9", today=date(2030, 5, 1))
    assert first == SHEET_HEAD
    assert [row[0] for row in table[:3]] == [OUTCOME.name_text, RECORD.title_text, RECORD.source_text]
    assert table[-1][0] == "Calculated with Fourcount 9.9 on 2030-05-01; score intervals at 95%."
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
    assert row[4]


@settings(max_examples=60)
@given(COUNTS, st.sampled_from(DESIGNS), st.sampled_from(FAMILIES), st.sampled_from(["", "12%", "0%", "100%", "x"]))
def test_every_table_can_be_exported(counts: tuple[int, ...], design: str, family: str, risk: str) -> None:
    """Any table gives a letter, a listing within its width and a sheet whose numbers are numbers."""
    choices = msgspec.convert({"family": family}, Choices)
    outcome = outcome_of(counts, design=design, risk=risk)
    assert letter(outcome, choices).endswith(".\n")
    assert all(len(line) <= WIDTH for line in on_screen(outcome, choices).splitlines())
    for row in table_of(outcome, choices)[1:]:
        assert len(row) == len(SHEET_HEAD)
        for cell in row[1:4]:
            assert cell == "" or NUMBER.fullmatch(cell.removeprefix("NNTB ").removeprefix("NNTH "))


@pytest.mark.parametrize("label", HOSTILE, ids=ascii)
def test_what_was_typed_cannot_break_out(label: str) -> None:
    """No label becomes a formula, a new cell or a new row, nor moves a terminal's cursor."""
    outcome = outcome_of((38, 374, 70, 339), label=label, risk="12%")
    sheet = sheet_of(outcome)
    lines = sheet.split("\n")
    assert lines.pop() == ""
    assert len(lines) == len(table_of(outcome))
    for line in lines:
        cells = line.split("\t")
        assert len(cells) == len(SHEET_HEAD)
        for cell in cells:
            assert NUMBER.fullmatch(cell) or not cell.startswith(("=", "+", "-", "@", "\uff1d", '"'))
    for text in (sheet, letter(outcome), on_screen(outcome)):
        assert not re.search("[\x00-\x08\x0b-\x1f\x7f\u202a-\u202e\u2066-\u2069]", text)


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


@given(st.text(st.characters(exclude_categories=())))
def test_one_line_is_one_line(text: str) -> None:
    """Whatever comes in, no break, tab or control character comes out, and nothing is put right twice."""
    line = one_line(text)
    assert len(line.splitlines()) <= 1
    assert "\t" not in line
    assert one_line(line) == line
    line.encode()


def test_words_joined_by_invisible_marks_stay_joined() -> None:
    """Letters of scripts that need a joiner keep it."""
    assert one_line("\u0645\u06cc\u200c\u0627\u0641\u062a\u062f") == "\u0645\u06cc\u200c\u0627\u0641\u062a\u062f"


def test_a_sheet_leaves_blank_what_is_withheld_and_repeats_no_row() -> None:
    """One limit of the number needed; the odds ratio at the study's own risk, where it is the risk ratio."""
    found = {row[0]: row for row in table_of(outcome_of((80, 20, 40, 60), risk="45%"))}
    needed = found["For one patient, 45%: NNTH"]
    assert (needed[2], bool(NUMBER.fullmatch(needed[3])), "would pass 100%" in needed[4]) == ("", True, True)
    assert not any("as a risk ratio" in row[0] for row in table_of(outcome_of((80, 20, 40, 60))))
