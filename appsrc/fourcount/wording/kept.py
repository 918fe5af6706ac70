"""Help: what is kept, where it lies, and how each of it is switched off."""

from __future__ import annotations

THE_FILE = (
    "One paper is one file, whose name ends in .fourcount. It is plain text (JSON in UTF-8) and holds what you typed "
    "and chose, nothing that was computed. Saving writes the whole file or leaves the old one as it was. Undo goes "
    "back beyond a save."
)
CHANGED = (
    "Before a file is written, it is compared with what was last read or written there. If someone else has changed "
    "it meanwhile, you are asked. A file that is damaged, too large, from a newer version or not a record is not "
    "opened, and stays as it is."
)
TWICE = "A file that is open in one window comes to the front when it is opened once more."
ASIDE = (
    "When you pause, what is not saved yet is set aside in {aside}. If the program or the computer then breaks off, "
    "the next start offers it beside what stands in the file, and opens it only if you say so."
)
ASIDE_ENDS = (
    "It is deleted as soon as nothing is unsaved: when you save, and when the window is closed as usual, whatever you "
    "answer about saving. It never leaves this computer. To switch it off, take the mark from “{keep_aside}” in the "
    "menu File; what is set aside is then deleted at once."
)
SETTINGS = (
    "The window’s size, the text size, the appearance, how people are drawn and the intervals last chosen are "
    "remembered in {settings}, and with them the names of the files last opened. To clear those names, or to remember "
    "none, use “{recent}” in the menu File. Nothing of a record is written there."
)
LOG = "An unexpected error leaves its kind and the lines of code it passed in {log}, and nothing that you typed."

KEPT = {"The file": (THE_FILE, CHANGED, TWICE), "Unsaved work": (ASIDE, ASIDE_ENDS), "Settings": (SETTINGS, LOG)}
"""Headings with their paragraphs."""
