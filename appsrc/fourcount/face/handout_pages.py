"""Which outcomes of a record can be on the page, and the page of those that are ticked."""

from __future__ import annotations

from datetime import date
from typing import NamedTuple

from fourcount import __version__
from fourcount.appraisal.appraise import appraise
from fourcount.appraisal.findings import OutcomeFindings
from fourcount.ink.handout import PAPERS, Handout, NoPage, compose
from fourcount.picture.options import USUAL
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Record
from fourcount.wording import handout_labels as labels
from fourcount.wording import names
from fourcount.wording.handout import why_no_page
from fourcount.wording.plain_refusal import why_not


class Candidate(NamedTuple):
    """One outcome of the record; ``why`` says why it cannot be on the page, "" where it can."""

    name: str
    outcome: Outcome
    findings: OutcomeFindings
    why: str


def candidates(record: Record) -> tuple[Candidate, ...]:
    """Every outcome with its findings, in the record's order."""
    found = []
    for number, outcome in enumerate(record.outcomes, 1):
        findings = appraise(outcome, record.choices)
        name = names.bare(outcome.name_text) or labels.UNNAMED.format(number=number)
        found.append(Candidate(name, outcome, findings, why_not(outcome, findings)))
    return tuple(found)


def page_of(record: Record, outcomes: tuple[Candidate, ...], paper: str, ranged: bool = False) -> Handout | NoPage:
    """The page of the outcomes that are ticked and ready, with their ranges if asked for; a sentence without one."""
    ticked = [one for one in outcomes if one.outcome.on_handout]
    named = [(one.outcome, one.findings) for one in ticked if not one.why]
    if ticked and not named:
        return NoPage(why_no_page([one.why for one in ticked]))
    options = USUAL._replace(uncertainty=ranged)
    return compose(record, named, PAPERS[paper], __version__, date.today(), options)
