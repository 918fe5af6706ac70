"""The words of the one page for a patient that belong to no outcome: heading, how to read it, where it is from."""

from __future__ import annotations

from collections.abc import Sequence
from datetime import date
from typing import NamedTuple

from fourcount.appraisal.findings import PatientFindings
from fourcount.record.outcome import Outcome
from fourcount.record.paper import Choices, Record
from fourcount.wording import handout_labels as labels
from fourcount.wording import names, numbers
from fourcount.wording.basis import basis
from fourcount.wording.plain_texts import EACH_FIGURE, EACH_FIGURE_OR_MARK, EACH_MARK, ONE_STUDY
from fourcount.wording.standing import STANDING_FULL
from fourcount.wording.subject import subject

HEADING = "{reference} or {index}"
ALL_SHOW = "Each picture shows {people} people, so you can compare them."
ONE_SHOWS = "The picture shows {people} people."
DIFFERENT = "The pictures do not all show the same number of people: see the number in each."
WORKED_OUT = "{name}: {basis}"
SOURCE = "Source: {source}."
NO_SOURCE = "Source: not given."
MADE = "Made on {date} with Fourcount {version}."

NOTHING_TICKED = "Tick at least one outcome for the page."
NOTHING_READY = "No outcome has all that a page needs yet. {why}"
TOO_MANY = "{fit} of these {count} outcomes fit on one page: untick {rest}."
TOO_LONG = "These names are too long for one page: shorten those of the groups and of the outcome."

MONTHS = (
    "January", "February", "March", "April", "May", "June",
    "July", "August", "September", "October", "November", "December",
)  # fmt: skip
"""The page is English wherever it is made: a window takes over the machine's language for dates."""

USUAL_NAME = "handout"
LONGEST_NAME = 80


class HandoutWords(NamedTuple):
    """``title`` and ``description`` go into the file, all else onto the page; ``foot`` is its small print."""

    title: str
    heading: str
    lead: str
    foot: tuple[str, ...]
    description: str


def handout_words(
    record: Record,
    pages: Sequence[tuple[Outcome, PatientFindings]],
    denominators: Sequence[int | None],
    sentences: Sequence[str],
    persons: Sequence[bool],
    version: str,
    today: date,
) -> HandoutWords:
    """``denominators``, ``sentences`` and ``persons`` are those of the outcomes on the page; this room has no clock.

    ``persons`` says of each that is drawn as people whether they are figures, and not marks.
    """
    title = names.bare(record.title_text)
    heading = _heading([subject(outcome) for outcome, _ in pages], title)
    each = {(True,): EACH_FIGURE, (False,): EACH_MARK, (): ""}.get(tuple(set(persons)), EACH_FIGURE_OR_MARK)
    lead = " ".join(part for part in (each, _metric(denominators)) if part)
    return HandoutWords(
        title=title or heading,
        heading=heading,
        lead=lead,
        foot=(ONE_STUDY, _basis(pages, record.choices), _source(record), *_made(version, today)),
        description=" ".join((heading, lead, *sentences)),
    )


def _heading(outcomes: Sequence[Outcome], title: str) -> str:
    """What is compared; the paper's title where its outcomes do not all compare the same."""
    compared = [
        HEADING.format(reference=names.label(outcome, "reference"), index=names.label_within(outcome, "index"))
        for outcome in outcomes
    ]
    return title if title and len(set(compared)) > 1 else names.sentence_case(compared[0])


def file_name(record: Record) -> str:
    """A name for the file after the paper's title, never after a patient; without what file systems refuse."""
    kept = "".join(letter if letter.isalnum() or letter in " -_" else " " for letter in record.title_text)
    return " ".join(kept.split())[:LONGEST_NAME].strip() or USUAL_NAME


def _metric(denominators: Sequence[int | None]) -> str:
    """Of how many people the pictures are; said loudest where they differ."""
    drawn = set(denominators)
    if len(drawn) > 1:
        return DIFFERENT
    people = drawn.pop()
    if people is None:
        return ""
    return (ALL_SHOW if len(denominators) > 1 else ONE_SHOWS).format(people=numbers.whole(people))


def _basis(pages: Sequence[tuple[Outcome, PatientFindings]], choices: Choices) -> str:
    """What each outcome's figures rest on, said once where it is the same for all."""
    said = [basis(outcome, patient, choices) for outcome, patient in pages]
    if len(set(said)) == 1:
        return said[0]
    titles = [
        names.bare(outcome.name_text) or labels.UNNAMED.format(number=i + 1) for i, (outcome, _) in enumerate(pages)
    ]
    return " ".join(WORKED_OUT.format(name=name, basis=text) for name, text in zip(titles, said, strict=True))


def _source(record: Record) -> str:
    parts = [names.bare(text) for text in (record.title_text, record.source_text)]
    source = ", ".join(part for part in parts if part)
    return SOURCE.format(source=source) if source else NO_SOURCE


def _made(version: str, today: date) -> tuple[str, ...]:
    day = f"{today.day} {MONTHS[today.month - 1]} {today.year}"
    return (MADE.format(date=day, version=version), " ".join(STANDING_FULL))


def why_no_page(lines: Sequence[str]) -> str:
    """Why no page can be made, where no outcome of the record has all that it needs."""
    return NOTHING_READY.format(why=next((line for line in lines if line), "")).strip()
