"""What always holds: the caution block on screen and in every export. Imports nothing: the first paint shows it."""

from __future__ import annotations

STANDING = (
    "Calculates and displays what a study’s numbers imply. Does not recommend, and does not replace clinical "
    "judgement, local guidelines or qualified advice. Averages of a study’s people, from what was typed: check it "
    "against the paper. One study is not all the evidence. Not assessed as a medical device."
)
"""The short block that is always on screen and on every page."""

STANDING_SHORT = (
    "Calculates and displays; does not recommend, and does not replace clinical judgement or local guidelines."
)
"""What stays on screen where the window is narrow; the short block then ends the page."""

STANDING_FULL = (
    (
        "Fourcount calculates and displays what a study’s numbers imply, for education and for discussion between a "
        "professional and a patient."
    ),
    "It does not recommend, and does not replace clinical judgement, local guidelines or qualified advice.",
    "The figures depend on what was typed: check it against the paper.",
    "They are averages of a study’s people and may not fit one person.",
    "One study is not all the evidence.",
    "Fourcount is not assessed as a medical device, and no such claim is made.",
)
"""The same in whole sentences, for exports and help."""
