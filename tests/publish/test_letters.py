"""Letters: short, the absolute first, each thing said once."""

from __future__ import annotations

import re
from datetime import date

import msgspec

from copies import OUTCOME, RECORD, letter, outcome_of, table_of
from fourcount.appraisal.appraise import appraise
from fourcount.publish.prose import prose
from fourcount.record.outcome import Patient
from fourcount.record.paper import Choices

LETTER = """\
Falls · Night lights on a rehabilitation ward · invented example · table 2

Randomised trial. Night lights: 38 fell at least once, 374 did not fall. Usual care: 70 fell at least once, 339 did \
not fall.

Of 100 people with usual care about 17 fell at least once within 12 months; of 100 with night lights about 9. That is \
8 fewer, and could be as few as 3 or as many as 13 (95% interval).

- Difference: 7.9 fewer per 100 (95% interval 3.3 to 12.6)
- Number needed to treat for one to benefit (NNTB) 13 (95% interval 8 to 31) over 12 months
- Risk with usual care: 17.1% (95% interval 13.8 to 21.1%), 70 of 409
- Risk with night lights: 9.2% (95% interval 6.8 to 12.4%), 38 of 412
- Risk ratio: 0.54 (95% interval 0.37 to 0.78), relative reduction 46%
- Odds ratio: 0.49 (95% interval 0.32 to 0.75), as a risk ratio at 12%: 0.52 (0.35 to 0.77)
- p < 0.001, two-sided (N−1 chi-square). It does not say how large the effect is; the \
intervals do.

The paper’s result: 0.54 (0.37 to 0.78) follows from the counts: the risk ratio is 0.539 (0.372 to 0.781) by the \
method shown, Miettinen–Nurminen score, or by Katz log and 1 other method, at 95%.

For one patient: starting risk 12% (ward audit 2025), risk ratio 0.54 (0.37 to 0.78) kept constant. Of 100 people with \
usual care 12 fell at least once within 12 months, of 100 with night lights 6 (95% interval 4 to 9): 6 fewer in 100 \
(95% interval 3 to 8). NNTB at this starting risk 19 (14 to 38). The interval leaves out that 12% is itself uncertain.
"""


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


def test_a_letter_reads_as_a_whole() -> None:
    """Each thing is said once and in as few words as it takes: counts, headline, figures, the patient."""
    patient = Patient(starting_risk_text="12%", starting_risk_source_text="ward audit 2025")
    outcome = msgspec.structs.replace(OUTCOME, patient=patient)
    text = prose(RECORD, outcome, appraise(outcome, RECORD.choices), version="9.9", today=date(2030, 5, 1))
    start, rest = text.split("\nCautions:\n")
    assert start == LETTER
    assert rest.endswith("Calculated with Fourcount 9.9 on 2030-05-01; score intervals at 95%.\n")


def test_a_letter_says_a_reason_and_a_correction_once() -> None:
    """Textbook, nobody in either group: why there is no interval stands behind the first line that lacks it."""
    text = letter(outcome_of((0, 50, 0, 50)), Choices(family="textbook"))
    figures = [line.removeprefix("- ") for line in text.split("\n") if line.startswith("- ")]
    no_width = "An interval of zero width is withheld; the score family gives a real one."
    added = (
        "interval with half added to the events and to the people of each group (Walter): it need not hold the estimate"
    )
    no_events = "Nobody in either group had the event, so this figure is not determined."
    assert figures[:4] == [
        f"Difference: 0.0 per 100 (95% interval withheld). {no_width}",
        "Risk in the reference group: 0.0% (95% interval withheld), 0 of 50",
        "Risk in the index group: 0.0% (95% interval withheld), 0 of 50",
        f"Risk ratio: not determined (95% interval 0.0202 to 49.4), {added}. {no_events}",
    ]
    zero = letter(outcome_of((0, 50, 7, 43)), Choices(family="textbook"))
    assert "- Risk ratio: 0 (95% interval 0.00391 to 1.14), relative reduction 100%, interval with half added" in zero


def test_a_number_needed_without_a_span_or_a_kind_says_so() -> None:
    """Equal groups have an NNT that is infinite; nobody takes a number for one of no time."""
    text = letter(outcome_of((10, 90, 10, 90)))
    assert "- Number needed to treat (NNT) ∞ (95% interval NNTB 12 to ∞ to NNTH 12), time span not given\n" in text
    equal = {row[0]: row for row in table_of(outcome_of((10, 90, 10, 90), risk="12%"))}
    assert equal["For one patient, 12%: NNT"][1] == "infinity"


def test_a_letter_of_a_welcome_event_speaks_of_the_event() -> None:
    """The patient's sentence counts what the headline counts."""
    outcome = msgspec.structs.replace(
        outcome_of((60, 40, 51, 49), risk="40%"), left_welcome=True, left_words_text="healed"
    )
    text = letter(outcome)
    assert (
        "Of 100 people in the reference group 40 healed, of 100 in the index group 47 (95% interval 37 to 61): "
        "7 more in 100 (95%" in text
    )
    assert "NNTB at this starting risk" in text
    assert letter(OUTCOME).count("For one patient: at the study’s own starting risk. The study’s figures hold") == 1


def test_a_full_stop_in_a_name_breaks_no_sentence() -> None:
    """Typed at the end of a name, it stands nowhere inside a sentence of ours."""
    text = letter(outcome_of((38, 374, 70, 339), label="Name.", risk="12%"))
    assert not re.search(r"Name\. [a-z(0-9]|Name\.[,:;)]|Name\.\.", text, re.IGNORECASE)


def figures_of(text: str) -> str:
    """What stands between the counts and the patient."""
    return text.split("\n\n", 1)[1].split("\n\nFor one patient", maxsplit=1)[0]


def test_a_letter_says_what_the_paper_prints_and_whether_it_follows() -> None:
    """The first sentence of the check stands for the others; without a printed result there is nothing of it."""
    odd = msgspec.structs.replace(OUTCOME, paper_text="RR 0.45 (0.37 to 0.78), P = 0.001")
    assert "The paper prints RR 0.45 (0.37 to 0.78), P = 0.001. Check" in letter(odd)
    assert "paper" not in figures_of(letter(msgspec.structs.replace(OUTCOME, paper_text="")))


def test_a_letter_names_the_kind_of_study() -> None:
    """What follows from a table depends on it."""
    assert "\nCase-control study. " in letter(outcome_of((38, 374, 70, 339), design="case-control"))
