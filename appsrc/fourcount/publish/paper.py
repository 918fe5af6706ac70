"""What a copy says of the paper itself: the kind of study, what it prints as its result, and whether that follows."""

from __future__ import annotations

from fourcount.appraisal.findings import OutcomeFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices
from fourcount.wording import exports, labels, names
from fourcount.wording.check import figure_lines


def study(outcome: Outcome) -> str:
    """``Randomised trial.``"""
    return exports.STUDY.format(design=names.sentence_case(labels.DESIGNS[outcome.design]))


def paper_says(outcome: Outcome, findings: OutcomeFindings, choices: Choices) -> tuple[str, ...]:
    """What the paper prints and the first sentence of the check of each of its figures; none where nothing was typed.

    A printed effect without counts stands in every copy already: of it only the sentence is given.
    """
    text = names.bare(outcome.paper_text)
    if not text:
        return ()
    from fourcount.appraisal.check import check  # a copy without a printed result starts without it

    found = [lines[0].text for figure in check(outcome, choices).figures if (lines := figure_lines(figure))]
    if findings.form == "effect-only":
        return tuple(found)
    if found and text in found[0]:  # the sentence says what is printed
        return (exports.PAPER_RESULT.format(said=found[0]), *found[1:])
    return (exports.PAPER_PRINTS.format(text=text), *found)
