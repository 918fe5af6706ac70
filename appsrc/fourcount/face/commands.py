"""What each command does to the session and the clipboard: one small function for each, no widget but dialogs."""

from __future__ import annotations

from datetime import date
from typing import TYPE_CHECKING

from PySide6.QtCore import QMimeData
from PySide6.QtGui import QGuiApplication

from fourcount import __version__
from fourcount.face.session import Session
from fourcount.ink.style import Style
from fourcount.record import editing
from fourcount.record.outcome import EventsAndOthers, EventsOfTotal
from fourcount.record.paper import Record

if TYPE_CHECKING:
    from fourcount.ink.picture import Picture


def new_table(session: Session) -> None:
    """Begin with an empty record that keeps the choice of intervals; undo brings the last one back."""
    session.change_record(Record(choices=session.record.choices))


def open_example(session: Session) -> None:
    """Show the worked example under the same choice of intervals; undo brings the last record back."""
    from fourcount.wording.example import worked_example

    example = worked_example()
    session.change_record(Record(
        title_text=example.title_text,
        source_text=example.source_text,
        outcomes=example.outcomes,
        choices=session.record.choices,
    ))  # fmt: skip


def swap_groups(session: Session) -> None:
    """Make the other group the index group."""
    session.change_outcome(editing.swap_groups(session.outcome))


def count_other_outcome(session: Session) -> None:
    """Count the other column."""
    session.change_outcome(editing.count_other_outcome(session.outcome))


def clear_counts(session: Session) -> None:
    """Empty the four cells."""
    session.change_outcome(editing.clear_table(session.outcome))


def change_form(session: Session) -> None:
    """Go from ``38 · 374`` to ``38 of 412``, or back."""
    now = session.outcome.table
    choose_form(session, "events-and-others" if isinstance(now, EventsOfTotal) else "events-of-total")


def choose_form(session: Session, form: str) -> None:
    """Take a form of print by its key."""
    kind = EventsOfTotal if form == "events-of-total" else EventsAndOthers
    session.change_outcome(editing.in_form(session.outcome, kind))


def change_layout(session: Session) -> None:
    """Run the groups the other way."""
    other = "across" if session.outcome.layout == "down" else "down"
    session.change_outcome(editing.with_layout(session.outcome, other))


def copy_text(session: Session) -> bool:
    """Put the findings as plain text on the clipboard; False while there are none."""
    from fourcount.publish.prose import prose

    if not _whole(session) or session.findings is None:
        return False
    text = prose(session.record, session.outcome, session.findings, version=__version__, today=date.today())
    QGuiApplication.clipboard().setText(text)
    return True


def copy_table(session: Session) -> bool:
    """Put the findings on the clipboard as a table for a spreadsheet or a letter; False while there are none."""
    from fourcount.publish.sheet import html, tsv

    if not _whole(session) or session.findings is None:
        return False
    data = QMimeData()
    data.setText(tsv(session.outcome, session.findings, session.record.choices))
    data.setHtml(html(session.outcome, session.findings, session.record.choices))
    QGuiApplication.clipboard().setMimeData(data)
    return True


def copy_picture(session: Session, picture: Picture | None, style: Style) -> bool:
    """Put the picture on the clipboard, with its sentences and cautions in it; False while there is none."""
    from fourcount.ink.picture import as_image
    from fourcount.wording.patient import picture_heading
    from fourcount.wording.cautions import STANDING

    if picture is None:
        return False
    image = as_image(
        picture,
        style,
        picture_heading(session.record, session.outcome),
        f"{STANDING} Fourcount {__version__}, {date.today():%Y-%m-%d}",
    )
    QGuiApplication.clipboard().setImage(image)
    return True


def _whole(session: Session) -> bool:
    from fourcount.appraisal.findings import Counts

    return session.findings is not None and isinstance(session.findings.counts, Counts)
