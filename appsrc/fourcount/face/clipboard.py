"""What leaves the window through the clipboard: text, a table, a picture, each with its cautions."""

from __future__ import annotations

from datetime import date
from typing import TYPE_CHECKING

from PySide6.QtCore import QMimeData
from PySide6.QtGui import QGuiApplication

from fourcount import __version__
from fourcount.face.session import Session
from fourcount.ink.style import Style

if TYPE_CHECKING:
    from fourcount.ink.picture import Picture


def copy_text(session: Session) -> bool:
    """Put the findings as plain text on the clipboard; False while there are none."""
    from fourcount.publish.prose import prose

    if session.findings is None or not _whole(session):
        return False
    text = prose(session.record, session.outcome, session.findings, version=__version__, today=date.today())
    QGuiApplication.clipboard().setText(text)
    return True


def copy_table(session: Session) -> bool:
    """Put the findings on the clipboard as a table for a spreadsheet or a letter; False while there are none."""
    from fourcount.publish.sheet import html, tsv

    if session.findings is None or not _whole(session):
        return False
    data, today = QMimeData(), date.today()
    data.setText(tsv(session.record, session.outcome, session.findings, version=__version__, today=today))
    data.setHtml(html(session.record, session.outcome, session.findings, version=__version__, today=today))
    QGuiApplication.clipboard().setMimeData(data)
    return True


def copy_picture(session: Session, picture: Picture | None, style: Style) -> bool:
    """Put the picture on the clipboard, with its sentences and cautions in it; False while there is none."""
    from fourcount.ink.picture import as_image
    from fourcount.wording.cautions import SAID_OF_THE_PATIENT, caution_text
    from fourcount.wording.exports import PICTURE_FOOT
    from fourcount.wording.patient import picture_heading
    from fourcount.wording.standing import STANDING

    if picture is None:
        return False
    heading = picture_heading(session.record, session.outcome)
    cautions = (
        [caution_text(caution) for caution in session.findings.cautions if caution.key not in SAID_OF_THE_PATIENT]
        if session.findings
        else []
    )
    foot = [*cautions, PICTURE_FOOT.format(standing=STANDING, version=__version__, date=date.today().isoformat())]
    QGuiApplication.clipboard().setImage(as_image(picture, style, heading, "\n".join(foot)))
    return True


def _whole(session: Session) -> bool:
    from fourcount.wording.form import lacking

    return session.findings is not None and lacking(session.findings) is None
