"""The few questions that the window asks, one function each, and its help windows."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from typing import TYPE_CHECKING

from PySide6.QtWidgets import QWidget

from fourcount import __version__
from fourcount.wording import labels

if TYPE_CHECKING:
    from fourcount.face.help_window import HelpWindow, Part
    from fourcount.face.look import Look


DIALOG_WIDTH = 460
"""Wide enough for a dialog's title."""


def ask_level(parent: QWidget, now: str, problem: str = "") -> str | None:
    """Ask for a confidence level, with what was wrong with the last answer; None if nothing was chosen."""
    from PySide6.QtWidgets import QInputDialog

    question = f"{problem}\n{labels.LEVEL_QUESTION}".strip()
    dialog = QInputDialog(parent)
    dialog.setWindowTitle(labels.LEVEL_TITLE)
    dialog.setLabelText(question)
    dialog.setTextValue(now)
    dialog.setMinimumWidth(DIALOG_WIDTH)
    return dialog.textValue() if dialog.exec() else None


def methods_window(look: Look, parent: QWidget) -> HelpWindow:
    """Every method with its formula and source, and what the program leaves out."""
    from fourcount.wording.help import LETTERS, limits_of_the_program, methods_and_sources, terms
    from fourcount.wording.standing import STANDING_FULL

    parts: list[Part] = [("figure", labels.HELP_TERMS)]
    for term, explanation in terms():
        parts += [("strong", term), ("body", explanation)]
    parts += [("figure", labels.HELP_LETTERS), ("body", LETTERS)]
    for heading, entries in methods_and_sources():
        parts.append(("figure", heading))
        for title, formula, source, note in entries:
            parts.append(("strong", title))
            texts: tuple[Part, ...] = (("body", formula), ("body", note), ("small", source))
            parts.extend(part for part in texts if part[1])
    parts.append(("figure", labels.HELP_LIMITS))
    parts.extend(("body", sentence) for sentence in (*limits_of_the_program(), *STANDING_FULL))
    return _window(look, parent, labels.HELP_TITLES["methods"], parts)


def keys_window(look: Look, parent: QWidget, menus: Mapping[str, Sequence[tuple[str, str]]]) -> HelpWindow:
    """The keys of every command, menu by menu, as this platform writes them."""
    from PySide6.QtGui import QKeySequence

    parts: list[Part] = [("body", labels.KEYS_INTRO)]
    paste = QKeySequence(QKeySequence.StandardKey.Paste).toString(QKeySequence.SequenceFormat.NativeText)
    more = [(keys.format(paste=paste), words) for keys, words in labels.KEYS_MORE]
    for menu, commands in {labels.KEYS_ANYWHERE: more, **menus}.items():
        parts.append(("strong", menu))
        parts.extend(("body", f"{keys or labels.NO_KEYS}\t{words}") for keys, words in commands)
    window = _window(look, parent, labels.HELP_TITLES["keys"], parts)
    window.fit_height()
    return window


def about_window(look: Look, parent: QWidget) -> HelpWindow:
    """What this is, its version, and what it is built on."""
    from importlib.metadata import PackageNotFoundError, version

    from PySide6.QtCore import qVersion

    from fourcount.face.look import family_in_use
    from fourcount.wording.standing import STANDING_FULL

    def of(name: str) -> str:
        try:
            return version(name)
        except PackageNotFoundError:
            return ""

    facts = {
        "version": __version__,
        "font": family_in_use(),
        "numpy": of("numpy"),
        "scipy": of("scipy"),
        "matplotlib": of("matplotlib"),
        "qt": qVersion(),
    }
    first, *rest = (line.format(**facts) for line in labels.ABOUT)
    parts: list[Part] = [("figure", first), *(("body", line) for line in rest)]
    parts.extend(("body", sentence) for sentence in STANDING_FULL)
    return _window(look, parent, labels.HELP_TITLES["about"], parts)


def _window(look: Look, parent: QWidget, title: str, parts: Sequence[Part]) -> HelpWindow:
    from fourcount.face.help_window import HelpWindow

    window = HelpWindow(look, title, parent)
    window.show_parts(parts)
    return window
