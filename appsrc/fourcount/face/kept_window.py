"""The help on what is kept, and where, with the folders of this computer."""

from __future__ import annotations

from pathlib import Path
from typing import TYPE_CHECKING

from PySide6.QtWidgets import QWidget

from fourcount.face.errors import LOG_NAME
from fourcount.face.help_window import HelpWindow
from fourcount.wording import keeping as words
from fourcount.wording.kept import KEPT

if TYPE_CHECKING:
    from fourcount.face.help_window import Part
    from fourcount.face.look import Look
    from fourcount.face.settings import Settings


def kept_window(look: Look, parent: QWidget, settings: Settings, aside: Path) -> HelpWindow:
    """What a file holds, what is set aside, what is remembered, and how each is switched off."""
    facts = {
        "aside": aside,
        "settings": settings.folder,
        "log": settings.folder / LOG_NAME,
        "keep_aside": words.KEEP_ASIDE.replace("&", ""),
        "recent": words.RECENT_MENU.replace("&", ""),
    }
    parts: list[Part] = []
    for heading, paragraphs in KEPT.items():
        parts.append(("strong", heading))
        parts.extend(("body", paragraph.format(**facts)) for paragraph in paragraphs)
    window = HelpWindow(look, words.KEPT_TITLE, parent)
    window.show_parts(parts)
    window.fit_height()
    return window
