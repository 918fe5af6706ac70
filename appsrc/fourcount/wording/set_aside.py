"""What is said of a record that was set aside, and of the one in its file: when, and what it holds."""

from __future__ import annotations

from datetime import datetime

from fourcount.record.editing import typed_texts
from fourcount.record.entry.digits import specimen
from fourcount.record.paper import Record
from fourcount.wording import keeping as words
from fourcount.wording.patient_labels import outcome_title

MOST_NAMED = 4
"""Outcomes that are named; of more, only the number is said."""

MOST_TEXTS = 6

LONGEST = 160
"""Characters of a title or a name: two of them may differ only at their ends."""


def when_text(moment: datetime) -> str:
    """A moment on the reader's own clock: "1 December 2026, 17:42"."""
    local = moment.astimezone()
    month = words.MONTHS[local.month - 1]
    return words.WHEN.format(day=local.day, month=month, year=local.year, hour=local.hour, minute=local.minute)


def record_lines(record: Record) -> list[str]:
    """What a record holds, in lines: its title, then its first outcomes with what is typed in each."""
    lines = [_line(record.title_text) or words.NO_TITLE]
    for place, outcome in enumerate(record.outcomes[:MOST_NAMED]):
        texts = [specimen(text) for text in typed_texts(outcome)[:MOST_TEXTS]]
        name = _line(outcome_title(outcome, place))
        lines.append(f"{name}: {' · '.join(texts)}" if texts else name)
    more = len(record.outcomes) - MOST_NAMED
    return [*lines, words.MORE_OUTCOMES.format(number=more)] if more > 0 else lines


def _line(text: str) -> str:
    """A text on one line, as far as there is room for it."""
    line = " ".join(text.split())
    return line if len(line) <= LONGEST else f"{line[: LONGEST - 1]}…"
